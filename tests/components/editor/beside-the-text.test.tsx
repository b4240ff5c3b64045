import { createRef } from "react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import { CitePanel, type CitableValue } from "@/components/editor/cite-panel";
import { ConflictView } from "@/components/editor/conflict-view";
import { StalePanel } from "@/components/editor/stale-panel";
import type { StaleValue } from "@/components/editor/unsettled-values";
import { WithdrawnPanel } from "@/components/editor/withdrawn-panel";
import { DraftNotices } from "@/components/forms/draft-notices";
import { findingsWith, words } from "../../helpers/findings-text";

beforeEach(() => {
  // jsdom lays nothing out, so it has no scrolling.
  Element.prototype.scrollIntoView = vi.fn();
});
afterEach(cleanup);

const value = (change: Partial<CitableValue>): CitableValue => ({
  group: "Hardness",
  recordId: "rec_1",
  versionId: "ver_1",
  field: "caseDepth",
  label: "SHD of T2 at fillet",
  text: "1.95 mm",
  tag: "T2",
  source: "measured",
  ...change,
});
const VALUES = [
  value({}),
  value({
    group: "Field return",
    recordId: "rec_2",
    field: "hours",
    label: "Hours in service",
    text: "11 400 h",
    tag: "F1",
    source: "stated",
  }),
  value({
    recordId: "rec_3",
    field: "coreConverted",
    label: "Core",
    text: "≈ 29.8 HRC",
    tag: "T3",
    source: "converted",
  }),
];

describe("values you can cite", () => {
  const show = (onCite = vi.fn(), onLeave = vi.fn()) => {
    render(
      <CitePanel
        values={VALUES}
        search={createRef()}
        isReadOnly={false}
        onCite={onCite}
        onLeave={onLeave}
      />,
    );
    return { onCite, onLeave, search: screen.getByRole("combobox", { name: "Find a value" }) };
  };

  test("stand in groups, each with its source", () => {
    show();
    const hardness = screen.getByRole("group", { name: "Hardness" });
    expect(
      within(hardness)
        .getAllByRole("option")
        .map((option) => option.textContent),
    ).toEqual([expect.stringContaining("T2, measured"), expect.stringContaining("T3, converted")]);
    expect(
      within(screen.getByRole("group", { name: "Field return" })).getAllByRole("option"),
    ).toHaveLength(1);
  });

  test("are found by words in any order, chosen with arrows and put in with Enter", () => {
    const { search, onCite } = show();
    fireEvent.change(search, { target: { value: "measured" } });
    expect(screen.getByText("No value fits these words.")).toBeTruthy();
    fireEvent.change(search, { target: { value: "T hardness" } });
    expect(screen.getAllByRole("option")).toHaveLength(2);
    fireEvent.keyDown(search, { key: "ArrowDown" });
    fireEvent.keyDown(search, { key: "ArrowDown" });
    expect(screen.getByRole("option", { selected: true }).textContent).toContain("29.8");
    expect(search.getAttribute("aria-activedescendant")).toBe(
      screen.getByRole("option", { selected: true }).id,
    );
    fireEvent.keyDown(search, { key: "Enter" });
    expect(onCite).toHaveBeenCalledExactlyOnceWith(VALUES[2]);
  });

  test("are left with Esc, and a second @ writes one", () => {
    const { search, onLeave } = show();
    fireEvent.keyDown(search, { key: "Escape" });
    fireEvent.keyDown(search, { key: "@" });
    expect(onLeave.mock.calls).toEqual([[], ["@"]]);
  });
});

const stale = (change: Partial<StaleValue> = {}): StaleValue => ({
  position: 12,
  label: "SHD of T2 at fillet",
  tag: "T2",
  section: "Hardness",
  cited: "1.94 ± 0.06 mm",
  versionId: "ver_1",
  now: {
    versionId: "ver_2",
    text: "1.95 ± 0.06 mm",
    by: "Tove Brandt",
    at: "2026-12-01T11:24:00Z",
    reason: "Indent 10 read again",
  },
  ...change,
});

describe("stale values", () => {
  const show = (values: StaleValue[], isReadOnly = false) => {
    const acts = { onShow: vi.fn(), onTake: vi.fn(), onKeep: vi.fn() };
    render(<StalePanel stale={values} isReadOnly={isReadOnly} {...acts} />);
    return acts;
  };

  test("show old and new, why and by whom, and where", () => {
    show([stale()]);
    const panel = screen.getByRole("status", { name: "Stale values" });
    for (const words of [
      "1 cited value is stale",
      "under Hardness",
      "1.94 ± 0.06 mm",
      "1.95 ± 0.06 mm",
      "Indent 10 read again (Tove Brandt)",
    ])
      expect(panel.textContent).toContain(words);
  });

  test("take the new value, one or all", () => {
    const [one, two] = [stale(), stale({ position: 40 })];
    const { onTake } = show([one, two]);
    fireEvent.click(
      screen.getAllByRole("button", { name: "Take the new value" })[1] ?? document.body,
    );
    fireEvent.click(screen.getByRole("button", { name: "Take all 2 new values" }));
    expect(onTake.mock.calls).toEqual([[[two]], [[one, two]]]);
  });

  test("are kept only with a reason", () => {
    const { onKeep } = show([stale()]);
    fireEvent.click(screen.getByRole("button", { name: "Keep, say why" }));
    const reason = screen.getByLabelText("Why the old value stays");
    const form = reason.closest("form");
    if (!form) throw new Error("no form");
    fireEvent.change(reason, { target: { value: "   " } });
    fireEvent.submit(form);
    expect(onKeep).not.toHaveBeenCalled();
    fireEvent.change(reason, { target: { value: " Read before the polish. " } });
    fireEvent.submit(form);
    expect(onKeep).toHaveBeenCalledExactlyOnceWith(stale(), "Read before the polish.");
  });

  test("that wait for their own source cannot be taken", () => {
    show([stale({ now: { ...stale().now, versionId: "ver_1" } })]);
    expect(screen.queryByRole("button", { name: "Take the new value" })).toBeNull();
    expect(screen.getByRole("status").textContent).toContain("Save T2 again.");
  });

  test("only tell, where nothing can be written", () => {
    show([stale()], true);
    expect(screen.queryAllByRole("button")).toEqual([]);
  });
});

test("a value whose source was withdrawn can be taken out", () => {
  const onTakeOut = vi.fn();
  render(
    <WithdrawnPanel
      withdrawn={[stale()]}
      isReadOnly={false}
      onShow={vi.fn()}
      onTakeOut={onTakeOut}
    />,
  );
  expect(screen.getByRole("region", { name: "Withdrawn sources" }).textContent).toContain(
    "1.94 ± 0.06 mm from T2, under Hardness",
  );
  fireEvent.click(screen.getByRole("button", { name: "Take it out" }));
  expect(onTakeOut).toHaveBeenCalledExactlyOnceWith(12);
});

describe("two who saved", () => {
  const conflict = {
    yours: { document: findingsWith(words("Mine.")), rootCause: "Fatigue" },
    theirs: { document: findingsWith(words("Theirs.")), rootCause: "Overload", revision: 9 },
    changedBy: "Tove Brandt",
    changedAt: "2026-12-01T11:40:00Z",
  };

  test("see both texts where they differ, who changed it, and choose", () => {
    const [onKeepMine, onTakeTheirs] = [vi.fn(), vi.fn()];
    render(
      <ConflictView conflict={conflict} onKeepMine={onKeepMine} onTakeTheirs={onTakeTheirs} />,
    );
    expect(screen.getByRole("alert").textContent).toMatch(
      /Findings were not saved.*Tove Brandt saved at.*kept here/,
    );
    expect(screen.getByRole("region", { name: "Root cause" }).textContent).toContain("Fatigue");
    const answer = screen.getByRole("region", { name: "Answer" });
    expect(answer.textContent).toContain("Mine.");
    expect(answer.textContent).toContain("Theirs.");
    expect(screen.queryByRole("region", { name: "Hardness" })).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "Keep mine" }));
    fireEvent.click(screen.getByRole("button", { name: "Take theirs" }));
    expect([onKeepMine.mock.calls.length, onTakeTheirs.mock.calls.length]).toEqual([1, 1]);
  });

  test("are told when only figures or styles differ", () => {
    render(
      <ConflictView
        conflict={{ ...conflict, theirs: { ...conflict.yours, revision: 9 } }}
        onKeepMine={vi.fn()}
        onTakeTheirs={vi.fn()}
      />,
    );
    expect(screen.getByText(/The words are the same/)).toBeTruthy();
  });
});

describe("notices", () => {
  const show = (
    state: React.ComponentProps<typeof DraftNotices>["state"],
    { changes = 0, keepsCopy = true } = {},
  ) =>
    render(
      <DraftNotices
        notSaved="Findings were not saved."
        state={state}
        keepsCopy={keepsCopy}
        changes={changes}
        signInHref="/sign-in"
        onTryAgain={vi.fn()}
      />,
    );

  test("without a connection count what is kept", () => {
    const { container } = show({ kind: "offline" }, { changes: 3 });
    expect(container.textContent?.replace(/\u00a0/g, " ")).toContain(
      "You can go on; 3 changes are kept on this device",
    );
  });

  test("after the sign-in ended lead back in", () => {
    show({ kind: "signed-out" });
    expect(screen.getByRole("link", { name: /Sign in/ }).getAttribute("href")).toBe("/sign-in");
  });

  test("say when the browser keeps no copy, and promise none", () => {
    const { container } = show({ kind: "offline" }, { keepsCopy: false });
    expect(container.textContent).toContain("This browser keeps no copy.");
    expect(container.textContent).toContain("still saved to the laboratory");
    expect(container.textContent).toContain("kept on this page only");
    expect(container.textContent).not.toContain("on this device");
  });

  test("of a saved text are none", () => {
    expect(show({ kind: "saved", at: null }).container.textContent).toBe("");
  });
});
