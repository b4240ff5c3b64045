import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { ChartPanel } from "@/components/charts/chart-panel";
import { hardnessProfile } from "@/lib/charts/hardness-profile";
import { profileInput } from "../../unit/charts/profile-input";

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const chart = hardnessProfile(profileInput());

describe("chart panel", () => {
  it("names the drawing by its result", () => {
    render(<ChartPanel chart={chart} fileName="T2" />);
    const image = screen.getByRole("img");
    expect(image.getAttribute("aria-label")).toContain("T2 at fillet: SHD 1.95 ± 0.06 mm.");
  });

  it("shows the same data as a table, in the same order", () => {
    render(<ChartPanel chart={chart} fileName="T2" />);
    fireEvent.click(screen.getByRole("button", { name: "Table" }));
    const rows = within(screen.getByRole("table")).getAllByRole("row");
    expect(rows).toHaveLength(chart.table.rows.length + 1);
    expect(rows[2]?.textContent).toBe(chart.table.rows[1]?.join(""));
    expect(screen.queryByRole("img")).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "Table" }));
    expect(screen.getByRole("img")).toBeTruthy();
  });

  it("reads the points from left to right with the arrow keys", () => {
    render(<ChartPanel chart={chart} fileName="T2" />);
    const plot = screen.getByRole("group");
    fireEvent.keyDown(plot, { key: "ArrowRight" });
    expect(screen.getByText("T2, 0.00 mm: 617 HV1, converted from HRC")).toBeTruthy();
    fireEvent.keyDown(plot, { key: "ArrowRight" });
    expect(screen.getByText("T2, 0.10 mm: 598 ± 12 HV1, left out")).toBeTruthy();
    fireEvent.keyDown(plot, { key: "End" });
    expect(screen.getByText("T1, 4.50 mm: 300 ± 12 HV1")).toBeTruthy();
    fireEvent.keyDown(plot, { key: "ArrowRight" });
    expect(screen.getByText("T1, 4.50 mm: 300 ± 12 HV1")).toBeTruthy();
    fireEvent.keyDown(plot, { key: "Escape" });
    expect(screen.queryByText(/300 ± 12/)).toBeNull();
  });

  it("saves the drawing with its legend as a file", async () => {
    const made: Blob[] = [];
    vi.stubGlobal(
      "URL",
      Object.assign(URL, {
        createObjectURL: (blob: Blob) => {
          made.push(blob);
          return "blob:chart";
        },
        revokeObjectURL: () => undefined,
      }),
    );
    const click = vi
      .spyOn(HTMLAnchorElement.prototype, "click")
      .mockImplementation(() => undefined);
    render(<ChartPanel chart={chart} fileName="T2" />);
    fireEvent.click(screen.getByRole("button", { name: "Save as SVG" }));
    expect(click).toHaveBeenCalledOnce();
    const svg = await made[0]?.text();
    expect(svg).toContain("left out");
    expect(svg).not.toContain("var(");
  });
});
