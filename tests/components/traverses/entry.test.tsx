import { cleanup, fireEvent, screen, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { cell, content, openStation, paste, type } from "./open-station";

vi.mock("next/navigation", () => ({ useRouter: () => ({ refresh: vi.fn() }) }));

beforeEach(() => {
  localStorage.clear();
  // jsdom lays nothing out, so it has no scrolling.
  Element.prototype.scrollIntoView = vi.fn();
});
afterEach(cleanup);

const inReadings = () => within(screen.getByRole("region", { name: "Readings of T2" }));
const depths = () =>
  screen.getAllByRole<HTMLInputElement>("textbox", { name: /^depth/ }).map((input) => input.value);

describe("typing indents", () => {
  test("a row typed at the foot becomes an indent with its hardness", async () => {
    openStation(station({ readings: [] }));
    type("depth, row 1", "0,50");
    type("first diagonal, indent 1", "63.2");
    type("second diagonal, indent 1", "63.2");
    fireEvent.blur(cell("depth, indent 1"));
    // 1 kgf: 1854.4 × 1 / 63.2² gives 464 (ISO 6507-1, the equation in µm and kgf).
    expect(await screen.findByText("464")).toBeDefined();
    expect(depths()[0]).toBe("0.50");
  });

  test("keys go down the column and back", () => {
    openStation();
    const first = cell("depth, indent 1");
    first.focus();
    vi.spyOn(window, "requestAnimationFrame").mockImplementation((work) => (work(0), 0));
    fireEvent.keyDown(first, { key: "Enter" });
    expect(document.activeElement).toBe(cell("depth, indent 2"));
    fireEvent.keyDown(cell("depth, indent 2"), { key: "ArrowUp" });
    expect(document.activeElement).toBe(first);
  });

  test("undo takes one cell back as one step, however many keys it took", () => {
    openStation();
    type("depth, indent 1", "0.3");
    type("depth, indent 1", "0.35");
    type("depth, indent 2", "2.00");
    fireEvent.keyDown(cell("depth, indent 1"), { key: "z", ctrlKey: true });
    expect(depths().slice(0, 2)).toEqual(["0.35", "1.90"]);
    fireEvent.keyDown(cell("depth, indent 1"), { key: "z", ctrlKey: true });
    expect(depths().slice(0, 2)).toEqual(["0.30", "1.90"]);
  });

  test.each([
    ["a word", "deep"],
    ["no number", "NaN"],
    ["a depth outside the part", "-0.2"],
    ["two numbers", "0.3 0.4"],
  ])("%s in a depth stays as typed and is told", async (_what, typed) => {
    openStation();
    type("depth, indent 1", typed);
    expect(await screen.findByRole("list", { name: "Cells to look at" })).toBeDefined();
    expect(cell("depth, indent 1").value).toBe(typed);
    expect(cell("depth, indent 1").getAttribute("aria-invalid")).toBe("true");
  });
});

describe("pasting a block", () => {
  test.each([
    ["tabs", "0.20\t54.0\t54.2\n0.60\t55.0\t55.4"],
    ["semicolons and decimal commas", "0,20;54,0;54,2\r\n0,60;55,0;55,4\r\n"],
    ["commas", "0.20,54.0,54.2\n0.60,55.0,55.4"],
    ["a row of headings", "Depth\td1\td2\n0.20\t54.0\t54.2\n0.60\t55.0\t55.4"],
  ])("with %s is read, said, and taken back by one press", async (_how, block) => {
    openStation();
    paste(block);
    expect((await inReadings().findByRole("status")).textContent).toMatch(/^Pasted 2 rows/);
    expect(depths().slice(3, 5).map(Number)).toEqual([0.2, 0.6]);
    fireEvent.click(inReadings().getByRole("button", { name: "Undo" }));
    expect(depths().slice(0, 4)).toEqual(["0.30", "1.90", "2.80", ""]);
  });

  test("that cannot be read changes nothing and says why", async () => {
    openStation();
    paste("one\ttwo\tthree\tfour\tfive\tsix\n1\t2\t3\t4\t5\t6");
    expect((await inReadings().findByRole("status")).textContent).toMatch(
      /Nothing in the table changed\./,
    );
    expect(depths()).toEqual(["0.30", "1.90", "2.80", ""]);
  });

  test("of more rows than a traverse holds changes nothing", async () => {
    openStation();
    paste(Array.from({ length: 10_001 }, (_, i) => `${(i + 1) / 100}\t600`).join("\n"));
    expect((await inReadings().findByRole("status")).textContent).toMatch(
      /Nothing in the table changed\./,
    );
    expect(depths()).toEqual(["0.30", "1.90", "2.80", ""]);
  });
});

describe("an indent left out", () => {
  test("needs a reason, stays struck through, and comes back", async () => {
    openStation();
    fireEvent.click(screen.getByRole("button", { name: /^Acts for indent 3/ }));
    fireEvent.click(await screen.findByRole("menuitem", { name: /Leave out/ }));
    const dialog = within(await screen.findByRole("dialog"));
    fireEvent.click(dialog.getByRole("button", { name: "Leave out" }));
    expect(dialog.getByText("Say why.")).toBeDefined();
    fireEvent.change(dialog.getByRole("textbox"), { target: { value: "Indent on a pore" } });
    fireEvent.click(dialog.getByRole("button", { name: "Leave out" }));
    const acts = await screen.findByRole("button", { name: /left out: Indent on a pore/ });
    fireEvent.click(acts);
    fireEvent.click(await screen.findByRole("menuitem", { name: /Put back/ }));
    expect(
      await screen.findByRole("button", { name: /^Acts for indent 3: (?!left)/ }),
    ).toBeDefined();
  });
});

test("whoever may not record sees the readings and why they are locked", () => {
  const { save } = openStation({ readOnlyBecause: "The report is signed." });
  expect(screen.getByText("The report is signed.")).toBeDefined();
  expect(cell("depth, indent 1").readOnly).toBe(true);
  paste("0.20\t54.0\t54.2\n0.60\t55.0\t55.4");
  expect(depths()).toEqual(["0.30", "1.90", "2.80"]);
  expect(save).not.toHaveBeenCalled();
});

function station(change: Parameters<typeof content>[0]) {
  return {
    traverse: {
      traverseId: "rec_t2",
      label: "T2",
      version: 4,
      content: content(change),
      by: "Tove Brandt",
      at: "2026-12-01T09:00:00Z",
    },
  };
}
