import { afterEach, describe, expect, test, vi } from "vitest";
import { cleanup, render, screen, within } from "@testing-library/react";
import { CaseSpine, type SpineNode } from "@/components/frame/case-spine";
import { spineGeometry } from "@/components/frame/spine-geometry";

const address = vi.hoisted(() => ({ pathname: "/" }));
vi.mock("next/navigation", () => ({ usePathname: () => address.pathname }));

afterEach(cleanup);

const NODES: readonly SpineNode[] = [
  { key: "evidence", label: "Evidence", href: "/cases/c/evidence", state: "complete", count: 9 },
  {
    key: "findings",
    label: "Findings",
    href: "/cases/c/findings",
    state: "needs-attention",
    note: "1 cited value stale",
  },
  { key: "sign-off", label: "Sign-off", href: null, state: "untouched" },
];

describe("case spine", () => {
  test("each link says its name, state, count and line two", () => {
    address.pathname = "/cases/c";
    render(<CaseSpine nodes={NODES} />);
    const links = within(screen.getByRole("navigation", { name: "Parts of the case" }));
    expect(links.getByRole("link", { name: /^Evidence\s*, Complete, ?9/ })).toBeTruthy();
    expect(
      links.getByRole("link", { name: /^Findings\s*, Needs attention, ?1 cited value stale$/ }),
    ).toBeTruthy();
  });

  test("a part without a page has no node, and its place is closed", () => {
    const { container } = render(<CaseSpine nodes={NODES} />);
    expect(screen.queryByText("Sign-off")).toBeNull();
    expect(container.querySelectorAll("svg > g")).toHaveLength(2);
  });

  test.each([
    ["/cases/c/findings", "Findings"],
    ["/cases/c/evidence/E1.1", "Evidence"],
  ])("at %s the current part is %s", (pathname, label) => {
    address.pathname = pathname;
    render(<CaseSpine nodes={NODES} />);
    expect(screen.getByRole("link", { current: "page" }).textContent).toContain(label);
  });

  test("the overview is no part, so nothing is current there", () => {
    address.pathname = "/cases/c";
    render(<CaseSpine nodes={NODES} />);
    expect(screen.queryByRole("link", { current: "page" })).toBeNull();
  });

  test("the root cause stands beneath the origin", () => {
    render(<CaseSpine nodes={NODES} rootCause="Bending fatigue" />);
    expect(screen.getByText(/Bending fatigue/).textContent).toBe("Root causeBending fatigue");
  });
});

describe("geometry of the spine", () => {
  test("nodes lie 52 apart and the origin 92 below the last", () => {
    const { nodes, originY } = spineGeometry(8);
    expect(nodes.map(({ y }) => y)).toEqual([36, 88, 140, 192, 244, 296, 348, 400]);
    expect(originY).toBe(492);
    expect(nodes[3]?.strand).toBe("M46 192C36 193 19.8 196 19.8 216V452C19.8 476 36 484 46 492");
  });

  test("strands keep their order from left to right, so none cross", () => {
    const columns = spineGeometry(8).nodes.map(({ strand }) =>
      Number(/ (\d+(?:\.\d+)?) \d+V/.exec(strand)?.[1]),
    );
    expect(columns).toEqual([...columns].sort((a, b) => a - b));
    expect(new Set(columns).size).toBe(8);
  });
});
