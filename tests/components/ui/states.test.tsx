import { afterEach, describe, expect, test } from "vitest";
import { cleanup, render, screen } from "@testing-library/react";
import { TemperStrip } from "@/components/ui/temper-strip";
import { GateMark } from "@/components/ui/gate-mark";
import { StateShape } from "@/components/ui/state-shape";
import { DueFlag } from "@/components/ui/due-flag";
import { Notice } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import { LoadingRows } from "@/components/ui/loading-rows";

afterEach(cleanup);

const plain = (text: string | null | undefined) => (text ?? "").replace(/\u00a0/g, " ");

describe("temper strip", () => {
  test.each([
    ["analysing", false, "Stage 4 of 7: Weighing", "Weighing", 4],
    ["analysing", true, "Stage 4 of 7: Weighing, on hold", "Weighing · on hold", 4],
    ["closed", false, "Stage 7 of 7: Closed", "Closed", 7],
    ["declined", false, "Declined", "Declined", 0],
    ["draft", false, "Draft", "Draft", 0],
  ] as const)("%s, on hold %s, is named and worded", (state, onHold, name, word, filled) => {
    render(<TemperStrip state={state} onHold={onHold} />);
    const strip = screen.getByRole("img", { name });
    expect(strip.textContent).toBe(word);
    const cells = [...strip.querySelectorAll("i")];
    expect(cells).toHaveLength(7);
    expect(cells.filter((cell) => cell.style.borderColor !== "")).toHaveLength(filled);
  });
});

test("shapes carry their word", () => {
  render(
    <>
      <GateMark met />
      <GateMark met={false} />
      <StateShape state="needs-attention" named />
    </>,
  );
  const names = screen.getAllByRole("img").map((shape) => shape.getAttribute("aria-label"));
  expect(names).toEqual(["Met", "Open", "Needs attention"]);
});

describe("due date", () => {
  const now = new Date("2026-12-01T11:00:00Z");

  test.each([
    ["2026-11-26", "26 Nov5 days late", true],
    ["2026-12-04", "4 Decin 3 days", true],
    ["2026-12-05", "5 Decin 4 days", false],
  ])("%s reads %s", (due, words, flagged) => {
    const { container } = render(<DueFlag due={due} now={now} />);
    expect(plain(container.textContent)).toBe(words);
    expect(container.querySelector("svg") !== null).toBe(flagged);
  });

  test("no due date is a dash with words", () => {
    const { container } = render(<DueFlag due={null} now={now} />);
    expect(container.textContent).toBe("–no due date");
  });
});

test("a notice is read out only where it comes while the page is open", () => {
  render(
    <>
      <Notice kind="readonly" title="Read only.">
        Issue 1 is signed.
      </Notice>
      <Notice kind="bad" title="T2 was not saved." live="assertive">
        Your 17 rows are kept below.
      </Notice>
    </>,
  );
  expect(screen.getByRole("alert").textContent).toBe(
    "T2 was not saved. Your 17 rows are kept below.",
  );
  expect(screen.queryByRole("status")).toBeNull();
});

test("a tag with a meaning has a shape beside its word", () => {
  const { container } = render(<Tag kind="bad">Not met</Tag>);
  expect(container.textContent).toBe("Not met");
  expect(container.querySelector("svg")).not.toBeNull();
});

test("loading rows come late, and say so when it takes long", () => {
  const { container } = render(<LoadingRows rows={2} columns={2} />);
  expect(container.firstElementChild?.className).toContain("appear-late");
  const words = screen.getByText("Still working. You can leave this page.");
  expect(words.className).toContain("[--appear-after:5s]");
});
