import { afterEach, describe, expect, test } from "vitest";
import { cleanup, render, screen } from "@testing-library/react";
import { Value } from "@/components/ui/value";
import { CitedChip } from "@/components/ui/cited-chip";
import { PersonName } from "@/components/ui/person";
import { Facts } from "@/components/ui/facts";

afterEach(cleanup);

const plain = (text: string | null | undefined) => (text ?? "").replace(/[\u00a0\u202f]/g, " ");

describe("a value", () => {
  test("shows number, uncertainty, unit and source, and says them in words", () => {
    const { container } = render(
      <Value value={1.951} uncertainty={0.058} unit="mm" origin="measured" source="T2" />,
    );
    expect(plain(container.querySelector("[aria-hidden]")?.textContent)).toBe("1.95 ± 0.06 mm");
    expect(container.querySelector(".sr-only")?.textContent).toBe(
      "1.95 plus or minus 0.06 millimetres",
    );
    expect(screen.getByRole("img", { name: "measured" })).toBeTruthy();
    expect(screen.getByText("T2")).toBeTruthy();
  });

  test("that was converted carries its sign as well as its shape", () => {
    const { container } = render(
      <Value value={56.93} decimals={1} unit="HRC" origin="converted" />,
    );
    expect(plain(container.querySelector("[aria-hidden]")?.textContent)).toBe("≈ 56.9 HRC");
    expect(screen.getByRole("img", { name: "converted" })).toBeTruthy();
  });

  test.each([null, undefined, Number.NaN])(
    "that is missing (%s) is a dash, never zero",
    (value) => {
      const { container } = render(<Value value={value} unit="mm" missing="not measured" />);
      expect(container.textContent).toBe("–not measured");
    },
  );
});

describe("a cited value", () => {
  test("is read out in words and shown as printed", () => {
    const { container } = render(
      <CitedChip
        value="1.95 ± 0.06 mm"
        source="T2"
        spoken="1.95 plus or minus 0.06 millimetres, from traverse T2"
        href="/cases/1/hardness"
      />,
    );
    expect(container.querySelector("[aria-hidden]")?.textContent).toBe("1.95 ± 0.06 mmT2");
    expect(
      screen.getByRole("link", { name: "1.95 plus or minus 0.06 millimetres, from traverse T2" }),
    ).toBeTruthy();
  });

  test("that is stale shows the old value struck out and leads to the new one", () => {
    const { container } = render(
      <CitedChip state="stale" was="1.94 ± 0.06 mm" value="1.95 ± 0.06 mm" source="T2" />,
    );
    expect(container.querySelector("s")?.textContent).toBe("1.94 ± 0.06 mm");
    expect(container.textContent).toBe("1.94 ± 0.06 mmnow1.95 ± 0.06 mmT2");
  });

  test("that was kept says since when, and one whose source is withdrawn says so", () => {
    const { container, rerender } = render(
      <CitedChip state="kept" value="1.94 ± 0.06 mm" source="T2" keptOn="27 Nov" />,
    );
    expect(container.textContent).toBe("1.94 ± 0.06 mmT2, 27 Nov, kept");
    rerender(<CitedChip state="withdrawn" value="1.8 mm" source="D4" />);
    expect(container.querySelector("s")?.textContent).toBe("1.8 mm");
    expect(container.textContent).toContain("D4 withdrawn");
  });
});

test("nobody yet is said in words", () => {
  const { container } = render(<PersonName name={null} />);
  expect(container.textContent).toBe("Unassigned");
});

test("facts are a list of names and values", () => {
  render(<Facts facts={[{ name: "Heat", value: "7K3391", mono: true }]} />);
  expect(screen.getByRole("term").textContent).toBe("Heat");
  expect(screen.getByRole("definition").textContent).toBe("7K3391");
});
