import { act, cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { Bench } from "@/components/viewer/bench";
import type { View } from "@/components/viewer/view";
import { fakeServer, type FakeServer, lengthOf, PICTURE } from "./fake-bench";

const VIEW: View = { scale: 1, x: 0, y: 0 };
const zoom = vi.hoisted(() => ({
  press: (_at: readonly [number, number], _isSecond: boolean, _view: unknown): void => undefined,
  panned: [] as [number, number][],
}));
vi.mock("@/components/viewer/use-deep-zoom", () => ({
  ZOOM_STEP: 1.4,
  useDeepZoom: (_host: unknown, _url: unknown, _margins: unknown, onPress: typeof zoom.press) => {
    zoom.press = onPress;
    return {
      view: VIEW,
      hasFailed: false,
      zoomBy: () => undefined,
      whole: () => undefined,
      oneToOne: () => undefined,
      panBy: (x: number, y: number) => zoom.panned.push([x, y]),
      show: () => undefined,
    };
  },
}));

let server: FakeServer;
beforeEach(() => {
  localStorage.clear();
  vi.spyOn(document, "visibilityState", "get").mockReturnValue("visible");
  zoom.panned = [];
  server = fakeServer();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const open = () =>
  render(
    <Bench
      picture={PICTURE}
      first={structuredClone(server.state)}
      film={[]}
      chosenId={null}
      acts={server.acts}
    />,
  );
const settle = () => act(async () => void (await new Promise((done) => setTimeout(done, 0))));
const press = async (x: number, y: number, isSecond = false) => {
  await act(async () => zoom.press([x, y], isSecond, VIEW));
  await settle();
};
const doublePress = async (x: number, y: number) => {
  await press(x, y);
  await press(x, y, true);
};
const key = async (pressed: string, more: object = {}) => {
  fireEvent.keyDown(document.activeElement ?? document.body, { key: pressed, ...more });
  await settle();
};
/** By hand: roles are worked out anew for the whole page at each look, which takes long here. */
function button(name: string): HTMLButtonElement {
  const isIt = (one: HTMLButtonElement) =>
    (one.getAttribute("aria-label") ?? one.textContent ?? "").trim().startsWith(name);
  const [found, ...more] = [...document.querySelectorAll("button")].filter(isIt);
  if (!found || more.length > 0) throw new Error(`${more.length + Number(!!found)} of ${name}`);
  return found;
}
const click = async (name: string) => {
  fireEvent.click(button(name));
  await settle();
};
const isOff = (name: string) => button(name).disabled;
const alertText = () => screen.getByRole("alert").textContent ?? "";

describe("drawing by mouse", () => {
  it("counts what was pressed when a double press ends it", async () => {
    open();
    await key("c");
    for (const x of [10, 20, 30]) await press(x, 10);
    await doublePress(40, 10);
    expect(server.shapes()).toEqual([
      {
        tool: "count",
        points: [
          [10, 10],
          [20, 10],
          [30, 10],
          [40, 10],
        ],
      },
    ]);
  });

  it("places one origin for a double press", async () => {
    open();
    await key("o");
    await doublePress(300, 400);
    expect(server.shapes()).toEqual([{ tool: "origin", point: [300, 400], landmark: null }]);
    expect(server.sent("place")).toHaveLength(1);
  });

  it("goes on with the same tool for the next mark", async () => {
    open();
    await key("l");
    for (const x of [0, 50, 100, 180]) await press(x, 0);
    expect(server.shapes()).toHaveLength(2);
  });

  it("takes points back, and puts the tool down with Escape", async () => {
    open();
    await key("f");
    await press(10, 10);
    await press(20, 20);
    await key("Backspace");
    await press(30, 30);
    await doublePress(40, 40);
    expect(server.shapes()).toEqual([
      {
        tool: "front",
        points: [
          [10, 10],
          [30, 30],
          [40, 40],
        ],
      },
    ]);
    await press(1, 1);
    await key("Escape");
    await doublePress(2, 2);
    expect(server.shapes()).toHaveLength(1);
    expect(screen.queryByRole("region", { name: /^Drawing/ })).toBeNull();
  });

  it("keeps what was drawn when there is no answer, and saves it then", async () => {
    open();
    await key("l");
    server.setAway(true);
    await press(0, 0);
    await press(70, 0);
    expect(alertText()).toMatch(/There was no answer.*What you drew is kept\./);
    server.setAway(false);
    await click("Finish");
    expect(server.shapes()).toEqual([lengthOf(70)]);
    expect(screen.queryByRole("alert")).toBeNull();
  });

  it("keeps what was drawn when the server refuses it, with its reason", async () => {
    server.acts.place = async () => ({
      ok: false,
      error: { code: "INVALID", message: "No.", fields: { geometry: "The edge crosses itself." } },
    });
    open();
    await key("a");
    await press(0, 0);
    await press(100, 100);
    await press(100, 0);
    await doublePress(0, 100);
    expect(alertText()).toBe("The edge crosses itself. What you drew is kept.");
    expect(isOff("Finish")).toBe(false);
  });
});

describe("drawing by keys", () => {
  it("sets points with the cross and ends a shape with a second Enter in one place", async () => {
    open();
    await key("f");
    expect(document.activeElement?.getAttribute("role")).toBe("application");
    await key("ArrowRight");
    await key("Enter");
    await key("ArrowDown", { shiftKey: true });
    await key("Enter");
    await key("ArrowDown", { shiftKey: true });
    await key("Enter");
    await key("Enter");
    expect(server.shapes()).toEqual([
      {
        tool: "front",
        points: [
          [501, 400],
          [501, 410],
          [501, 420],
        ],
      },
    ]);
    await key("Enter");
    await key("ArrowLeft");
    await key("Enter");
    expect(screen.getByText("Take back a point")).toHaveProperty("disabled", false);
    expect(server.shapes()).toHaveLength(1);
  });

  it("places one origin however often Enter is pressed in one place, or held", async () => {
    open();
    await key("o");
    await key("ArrowUp");
    await key("Enter");
    await key("Enter");
    await key("Enter", { repeat: true });
    expect(server.shapes()).toEqual([{ tool: "origin", point: [500, 399], landmark: null }]);
  });

  it("leaves letters to a field that is typed in", async () => {
    open();
    await key("l");
    screen.getByLabelText("Name").focus();
    await key("a");
    await key("Backspace");
    expect(screen.getByRole("region", { name: "Drawing: Length" })).toBeDefined();
  });

  it("moves the picture with the Move tool", async () => {
    open();
    await key("ArrowRight");
    expect(zoom.panned).toEqual([[60, 0]]);
  });

  it("takes up no tool that this person may not use", async () => {
    server = fakeServer({
      mayNotMark: "Only the people of the case mark.",
      mayNotCalibrate: "No.",
    });
    open();
    await key("l");
    await press(1, 1);
    await press(9, 9);
    expect(server.calls).toEqual([]);
    expect(screen.queryByRole("toolbar")).toBeNull();
    expect(screen.getByText(/Read only\. Only the people of the case mark\./)).toBeDefined();
  });
});

describe("the list of keys", () => {
  it("opens with ? and with its button, and stops the keys beneath it", async () => {
    open();
    await key("?");
    const dialog = screen.getByRole("dialog", { name: "Keys of the image bench" });
    expect(within(dialog).getByText("Undo")).toBeDefined();
    await key("l");
    expect(screen.queryByRole("region", { name: /^Drawing/ })).toBeNull();
    fireEvent.click(within(dialog).getAllByRole("button", { name: "Close" })[0] as HTMLElement);
    await settle();
    expect(screen.queryByRole("dialog")).toBeNull();
    await click("Keys");
    expect(screen.getByRole("dialog")).toBeDefined();
  });

  it("turns single letters off, for this person and the next time too", async () => {
    const { unmount } = open();
    await key("?");
    fireEvent.click(screen.getByRole("checkbox"));
    fireEvent.click(screen.getAllByRole("button", { name: "Close" })[0] as HTMLElement);
    await settle();
    await key("l");
    expect(screen.queryByRole("region", { name: /^Drawing/ })).toBeNull();
    unmount();
    open();
    await key("l");
    expect(screen.queryByRole("region", { name: /^Drawing/ })).toBeNull();
  });
});

describe("undo and redo", () => {
  it("take a placed mark off and put it back under its label", async () => {
    open();
    expect([isOff("Undo"), isOff("Redo")]).toEqual([true, true]);
    await key("l");
    await press(0, 0);
    await press(50, 0);
    await key("z", { ctrlKey: true });
    expect(server.shapes()).toEqual([]);
    expect(isOff("Undo")).toBe(true);
    await key("z", { ctrlKey: true, shiftKey: true });
    expect(server.state.marks.map(({ label }) => label)).toEqual(["D1"]);
    expect(isOff("Redo")).toBe(true);
  });

  it("go back through moves one by one, and forget what was undone when something new is done", async () => {
    server.add(lengthOf(100));
    open();
    await click("D1");
    for (const x of [200, 300]) {
      await click("Edit points");
      await click("Point after");
      await press(x, 0);
      await click("Save the points");
    }
    expect(server.shapes()).toEqual([lengthOf(300)]);
    await click("Undo");
    expect(server.shapes()).toEqual([lengthOf(200)]);
    await click("Undo");
    expect(server.shapes()).toEqual([lengthOf(100)]);
    await click("Redo");
    expect(server.shapes()).toEqual([lengthOf(200)]);
    await click("Delete D1");
    expect(isOff("Redo")).toBe(true);
    await click("Undo");
    await click("Undo");
    expect(server.shapes()).toEqual([lengthOf(100)]);
  });

  it("leave a mark alone that somebody else has moved since, and say so", async () => {
    open();
    await key("l");
    await press(0, 0);
    await press(50, 0);
    await key("Escape");
    server.move("mark_1", lengthOf(55));
    await click("Undo");
    expect(server.shapes()).toEqual([lengthOf(55)]);
    expect(alertText()).toBe("D1 was left as it is: Tove Brandt has moved it since.");
    expect(isOff("Undo")).toBe(true);
    expect(server.sent("remove")).toEqual([]);
  });

  it("are not stopped by a new scale, which moves no point", async () => {
    open();
    await key("l");
    await press(0, 0);
    await press(50, 0);
    server.move("mark_1", lengthOf(50));
    await click("Undo");
    expect(server.shapes()).toEqual([]);
  });

  it("may be tried again after there was no answer", async () => {
    open();
    await key("l");
    await press(0, 0);
    await press(50, 0);
    server.setAway(true);
    await click("Undo");
    expect(server.shapes()).toEqual([lengthOf(50)]);
    server.setAway(false);
    expect(isOff("Undo")).toBe(false);
    await click("Undo");
    expect(server.shapes()).toEqual([]);
  });

  it("run one at a time, however fast the keys are", async () => {
    open();
    await key("l");
    for (const x of [0, 50, 100, 180]) await press(x, 0);
    act(() => {
      for (let i = 0; i < 2; i += 1) fireEvent.keyDown(document.body, { key: "z", ctrlKey: true });
    });
    await settle();
    expect(server.shapes()).toHaveLength(1);
    expect(server.sent("remove")).toHaveLength(1);
  });
});

describe("moving points", () => {
  beforeEach(async () => {
    server.add(lengthOf(100));
    open();
    await click("D1");
    await click("Edit points");
  });

  it("works without dragging: by a press, by keys, by buttons", async () => {
    const panel = screen.getByRole("region", { name: "Points of D1" });
    expect(within(panel).getByText("Point 1 of 2")).toBeDefined();
    await key("ArrowRight");
    await key("ArrowDown", { shiftKey: true });
    await click("Add one after");
    expect(within(panel).getByText("Point 2 of 3")).toBeDefined();
    await press(60, 40);
    await click("Point after");
    await click("Take it out");
    await key("Enter");
    expect(server.shapes()).toEqual([
      {
        tool: "length",
        points: [
          [1, 10],
          [60, 40],
        ],
      },
    ]);
    expect(screen.queryByRole("region", { name: "Points of D1" })).toBeNull();
  });

  it("is given up with Undo and with Escape, and nothing is sent", async () => {
    await press(60, 40);
    await click("Undo");
    expect(screen.queryByRole("region", { name: "Points of D1" })).toBeNull();
    await click("Edit points");
    await press(60, 40);
    await key("Escape");
    expect(server.calls).toEqual([]);
    expect(server.shapes()).toEqual([lengthOf(100)]);
  });

  it("keeps the points when there is no answer", async () => {
    await click("Point after");
    await press(120, 0);
    server.setAway(true);
    await click("Save the points");
    expect(alertText()).toMatch(/There was no answer.*Your points are kept here\./);
    server.setAway(false);
    await click("Save the points");
    expect(server.shapes()).toEqual([lengthOf(120)]);
  });
});

describe("two people on one mark", () => {
  beforeEach(async () => {
    server.add(lengthOf(100));
    open();
    await click("D1");
    await click("Edit points");
    await click("Point after");
    await press(120, 0);
  });
  const dialog = () => screen.getByRole("dialog", { name: "D1 was changed by Tove Brandt" });

  it("shows both versions, and mine is saved only when I say so", async () => {
    server.move("mark_1", lengthOf(90));
    await click("Save the points");
    expect(within(dialog()).getByText("Yours")).toBeDefined();
    expect(within(dialog()).getByText("Tove Brandt")).toBeDefined();
    expect(server.shapes()).toEqual([lengthOf(90)]);
    await click("Keep mine");
    expect(server.shapes()).toEqual([lengthOf(120)]);
    expect(server.state.marks[0]?.number).toBe(3);
    expect(screen.queryByRole("dialog")).toBeNull();
    await click("Undo");
    expect(server.shapes()).toEqual([lengthOf(90)]);
  });

  it("finds the conflict even when the other's points were on screen already", async () => {
    server.move("mark_1", lengthOf(90));
    await screen.findByText("Tove Brandt, likely", {}, { timeout: 10_000 });
    await click("Save the points");
    expect(dialog()).toBeDefined();
    await click("Take theirs");
    expect(server.shapes()).toEqual([lengthOf(90)]);
    expect(screen.queryByRole("region", { name: "Points of D1" })).toBeNull();
    expect(isOff("Undo")).toBe(true);
  });

  it("may be decided later, with the points still in hand", async () => {
    server.move("mark_1", lengthOf(90));
    await click("Save the points");
    fireEvent.click(within(dialog()).getByRole("button", { name: "Close" }));
    await settle();
    expect(screen.getByRole("region", { name: "Points of D1" })).toBeDefined();
    await click("Save the points");
    expect(dialog()).toBeDefined();
  });

  it("asks again when they move it once more before I answer", async () => {
    server.move("mark_1", lengthOf(90));
    await click("Save the points");
    server.acts.change = ((change) => async (input) => {
      server.acts.change = change;
      server.move("mark_1", lengthOf(80));
      return change(input);
    })(server.acts.change);
    await click("Keep mine");
    expect(dialog()).toBeDefined();
    expect(server.shapes()).toEqual([lengthOf(80)]);
  });

  it("asks nothing when only values were worked out anew", async () => {
    server.move("mark_1", lengthOf(100));
    await click("Save the points");
    expect(screen.queryByRole("dialog")).toBeNull();
    expect(server.shapes()).toEqual([lengthOf(120)]);
  });

  it("says that the mark was deleted, and keeps my points", async () => {
    server.move("mark_1", lengthOf(90));
    await click("Save the points");
    server.deleteElsewhere("mark_1");
    await click("Keep mine");
    expect(alertText()).toBe(
      "D1 was deleted in the meantime. Restore it first. Your points are kept here.",
    );
    await click("Restore D1");
    await click("Save the points");
    await click("Keep mine");
    expect(server.shapes()).toEqual([lengthOf(120)]);
  });
});
