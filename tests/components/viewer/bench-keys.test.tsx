import { describe, expect, it } from "vitest";
import { KEY_LIST, readKey } from "@/components/viewer/bench-keys";
import { BENCH_TOOLS, TOOL_KEYS } from "@/components/viewer/tools";

const press = (key: string, held: Partial<KeyboardEvent> = {}, letters = true) =>
  readKey(
    { key, ctrlKey: false, metaKey: false, altKey: false, shiftKey: false, ...held },
    letters,
  );

describe("keys of the bench", () => {
  it("take up each tool by a letter of its own", () => {
    expect(new Set(Object.values(TOOL_KEYS)).size).toBe(BENCH_TOOLS.length);
    for (const tool of BENCH_TOOLS) {
      expect(press(TOOL_KEYS[tool])).toEqual({ does: "takeUp", tool });
      expect(press(TOOL_KEYS[tool].toUpperCase())).toEqual({ does: "takeUp", tool });
    }
  });

  it.each([
    ["+", "zoomIn"],
    ["=", "zoomIn"],
    ["-", "zoomOut"],
    ["0", "whole"],
    ["h", "hide"],
    ["?", "keyList"],
    ["Escape", "leave"],
    ["Backspace", "takeBack"],
    ["Enter", "set"],
  ])("%s: %s", (key, does) => {
    expect(press(key)).toEqual({ does });
  });

  it("move by one pixel, with Shift by ten", () => {
    expect(press("ArrowLeft")).toEqual({ does: "step", by: [-1, 0] });
    expect(press("ArrowDown", { shiftKey: true })).toEqual({ does: "step", by: [0, 10] });
  });

  it("go back and forth with Ctrl or the command key", () => {
    expect(press("z", { ctrlKey: true })).toEqual({ does: "undo" });
    expect(press("z", { metaKey: true })).toEqual({ does: "undo" });
    expect(press("Z", { ctrlKey: true, shiftKey: true })).toEqual({ does: "redo" });
    expect(press("y", { ctrlKey: true })).toEqual({ does: "redo" });
  });

  it("leave the browser its own keys, and mean nothing otherwise", () => {
    for (const key of ["a", "c", "s", "f", "+", "0"]) {
      expect(press(key, { ctrlKey: true })).toBeNull();
    }
    expect(press("ArrowLeft", { altKey: true })).toBeNull();
    expect(press("Tab")).toBeNull();
    expect(press("x")).toBeNull();
  });

  it("that print a sign can all be turned off; the rest stay", () => {
    const signs = [...Object.values(TOOL_KEYS), "+", "=", "-", "0", "h", "?"];
    expect(signs.map((key) => press(key, {}, false))).toEqual(signs.map(() => null));
    expect(press("Enter", {}, false)).toEqual({ does: "set" });
    expect(press("ArrowUp", {}, false)).not.toBeNull();
    expect(press("z", { ctrlKey: true }, false)).toEqual({ does: "undo" });
  });

  it("are all in the list that people see", () => {
    const listed = KEY_LIST.map(({ keys }) => keys.join(" "));
    for (const tool of BENCH_TOOLS) expect(listed).toContain(TOOL_KEYS[tool].toUpperCase());
    expect(listed).toEqual(expect.arrayContaining(["Enter", "Backspace", "Esc", "Ctrl Z", "?"]));
    expect(new Set(listed).size).toBe(listed.length);
  });
});
