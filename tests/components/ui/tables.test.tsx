import { afterEach, expect, test } from "vitest";
import { cleanup, render, screen, within } from "@testing-library/react";
import { GroupRow, SortTh, Table, Td, Th, Tr } from "@/components/ui/table";
import { TabLinks } from "@/components/ui/tab-links";

afterEach(cleanup);

test("a table has a caption, scoped heads, one sorted column and counted groups", () => {
  render(
    <Table caption="Open cases">
      <thead>
        <tr>
          <SortTh href="?sort=case" sorted={null}>
            Case
          </SortTh>
          <SortTh href="?sort=-due" sorted="ascending">
            Due
          </SortTh>
          <Th numeric>Items</Th>
        </tr>
      </thead>
      <tbody>
        <GroupRow columns={3} count={2}>
          Late
        </GroupRow>
        <Tr chosen>
          <Td>RL-2026-0142</Td>
          <Td>11 Dec</Td>
          <Td numeric>9</Td>
        </Tr>
      </tbody>
    </Table>,
  );
  const table = screen.getByRole("table", { name: "Open cases" });
  const heads = within(table).getAllByRole("columnheader");
  expect(heads.map((head) => head.getAttribute("aria-sort"))).toEqual([null, "ascending", null]);
  expect(heads.map((head) => head.querySelector("svg") !== null)).toEqual([false, true, false]);
  expect(within(table).getByRole("rowheader").textContent).toBe("Late2");
  expect(screen.getByRole("row", { selected: true }).textContent).toContain("RL-2026-0142");
});

test("saved views are links of which one is the current page", () => {
  render(
    <TabLinks
      label="Views"
      items={[
        { href: "/cases", label: "Open", count: 16, current: true },
        { href: "/cases?view=mine", label: "Mine", current: false },
      ]}
    />,
  );
  const links = within(screen.getByRole("navigation", { name: "Views" })).getAllByRole("link");
  expect(links.map((link) => link.getAttribute("aria-current"))).toEqual(["page", null]);
  expect(links[0]?.textContent).toBe("Open16");
});
