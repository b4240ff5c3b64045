import { afterEach, describe, expect, test } from "vitest";
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import {
  NumberField,
  SelectField,
  TextAreaField,
  TextField,
} from "@/components/ui/labelled-fields";
import { RadioGroup } from "@/components/ui/radio-group";
import { Checkbox } from "@/components/ui/checkbox";
import { WorkedOut } from "@/components/ui/worked-out";

afterEach(cleanup);

/** The words that are read out after a field's name. */
function description(field: HTMLElement): string[] {
  const ids = field.getAttribute("aria-describedby")?.split(" ") ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent ?? `no element ${id}`);
}

describe("a labelled field", () => {
  test("ties label, error, help and unit to its control, the error first", () => {
    render(
      <NumberField
        name="depthMm"
        label="Depth"
        unit="mm"
        hint="Below the surface"
        error="This needs one number."
      />,
    );
    const field = screen.getByLabelText("Depth");
    expect(field.id).toBe("depthMm");
    expect(field.getAttribute("aria-invalid")).toBe("true");
    expect(description(field)).toEqual(["This needs one number.", "Below the surface", "mm"]);
  });

  test("says nothing of errors when there is none", () => {
    render(<TextField name="heat" label="Heat" error={[]} />);
    const field = screen.getByLabelText("Heat");
    expect(field.hasAttribute("aria-invalid")).toBe(false);
    expect(field.hasAttribute("aria-describedby")).toBe(false);
  });

  test("keeps what was typed in a number field, comma and places included", () => {
    render(<NumberField name="depthMm" label="Depth" />);
    const field = screen.getByLabelText<HTMLInputElement>("Depth");
    fireEvent.change(field, { target: { value: "1,950" } });
    expect(field.value).toBe("1,950");
    expect(field.type).toBe("text");
  });

  test("holds for text areas and selects alike", () => {
    render(
      <>
        <TextAreaField name="what" label="What happened" optional error="Say what happened." />
        <SelectField
          name="table"
          label="Table"
          placeholder="Choose a table"
          options={[{ value: "a1", label: "Table A.1" }]}
          hint="Low-alloy steels"
        />
      </>,
    );
    expect(description(screen.getByLabelText("What happened optional"))).toEqual([
      "Say what happened.",
    ]);
    expect(description(screen.getByLabelText("Table"))).toEqual(["Low-alloy steels"]);
    expect(screen.getAllByRole("option").map((option) => option.textContent)).toEqual([
      "Choose a table",
      "Table A.1",
    ]);
  });
});

test("radio buttons are one group with a name, an error and one choice", () => {
  render(
    <RadioGroup
      name="scale"
      label="Scale"
      error="Choose one."
      defaultValue="HV1"
      options={[
        { value: "HV1", label: "HV1" },
        { value: "HV10", label: "HV10" },
      ]}
    />,
  );
  const group = screen.getByRole("group", { name: "Scale" });
  expect(description(group)).toEqual(["Choose one."]);
  fireEvent.click(screen.getByLabelText("HV10"));
  expect(screen.getByLabelText<HTMLInputElement>("HV1").checked).toBe(false);
});

test("a check box is named even where its label is not shown", () => {
  render(<Checkbox label="RL-2026-0142" labelHidden name="case" />);
  expect(screen.getByRole("checkbox", { name: "RL-2026-0142" })).toBeTruthy();
});

test("a worked-out value is an output and cannot be typed in", () => {
  render(<WorkedOut label="Limit hardness" value="448" unit="HV1" rule="80 % of 560 HV1" />);
  expect(screen.getByRole("status").textContent).toBe("448HV1");
  expect(screen.queryByRole("textbox")).toBeNull();
});
