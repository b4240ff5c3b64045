import { afterEach, describe, expect, test, vi } from "vitest";
import { act, cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { ConfirmDialog } from "@/components/forms/confirm-dialog";
import { FormErrorSummary, formErrors } from "@/components/forms/form-error-summary";
import { SubmitButton } from "@/components/forms/submit-button";
import { NumberField } from "@/components/ui/labelled-fields";
import { Button } from "@/components/ui/button";

afterEach(cleanup);

describe("the list of errors", () => {
  const errors = formErrors({
    depthMm: "Depth needs one number.",
    loadKgf: ["Load needs one number.", "Choose HV0.1 to HV100."],
  });

  test("takes the focus when it comes and leads to each field", () => {
    const fields = (
      <>
        <NumberField name="depthMm" label="Depth" />
        <NumberField name="loadKgf" label="Load" />
      </>
    );
    const { rerender } = render(
      <>
        <FormErrorSummary errors={[]} />
        {fields}
      </>,
    );
    expect(screen.queryByRole("group")).toBeNull();
    rerender(
      <>
        <FormErrorSummary errors={errors} />
        {fields}
      </>,
    );
    const list = screen.getByRole("group", { name: "What needs a change" });
    expect(document.activeElement).toBe(list);
    expect(list.textContent).toContain("2 things need a change. What you typed is kept.");
    fireEvent.click(screen.getByRole("link", { name: /Load needs one number. Choose HV0.1/ }));
    expect(document.activeElement).toBe(screen.getByLabelText("Load"));
  });
});

describe("a question before what cannot be undone", () => {
  function ask(onConfirm: () => Promise<string | void>) {
    render(
      <ConfirmDialog
        trigger={<Button>Withdraw</Button>}
        title="Withdraw M2?"
        description="T2 and 1 cited value rest on it and will be marked stale."
        keepLabel="Keep M2"
        actLabel="Withdraw M2"
        onConfirm={onConfirm}
      />,
    );
    fireEvent.click(screen.getByRole("button", { name: "Withdraw" }));
    return screen.findByRole("dialog", { name: "Withdraw M2?" });
  }

  test("puts the safe choice first and gives it the focus", async () => {
    await ask(async () => undefined);
    const names = screen.getAllByRole("button", { name: / M2$/ }).map((each) => each.textContent);
    expect(names).toEqual(["Keep M2", "Withdraw M2"]);
    await waitFor(() =>
      expect(document.activeElement).toBe(screen.getByRole("button", { name: "Keep M2" })),
    );
  });

  test("does nothing when it is left", async () => {
    const onConfirm = vi.fn(async () => undefined);
    const dialog = await ask(onConfirm);
    fireEvent.keyDown(dialog, { key: "Escape" });
    await waitFor(() => expect(screen.queryByRole("dialog")).toBeNull());
    expect(onConfirm).not.toHaveBeenCalled();
  });

  test("stays and says what happened when the act fails", async () => {
    await ask(async () => "M2 was not withdrawn. Tove Brandt changed it at 11:40.");
    fireEvent.click(screen.getByRole("button", { name: "Withdraw M2" }));
    expect((await screen.findByRole("alert")).textContent).toContain("M2 was not withdrawn.");
    expect(screen.getByRole("dialog")).toBeTruthy();
  });

  test("acts once, however often it is pressed, and closes when done", async () => {
    let finish: () => void = () => undefined;
    const onConfirm = vi.fn(() => new Promise<void>((resolve) => (finish = resolve)));
    await ask(onConfirm);
    const button = screen.getByRole("button", { name: "Withdraw M2" });
    fireEvent.click(button);
    await waitFor(() => expect(button.getAttribute("aria-disabled")).toBe("true"));
    fireEvent.click(button);
    await act(async () => finish());
    await waitFor(() => expect(screen.queryByRole("dialog")).toBeNull());
    expect(onConfirm).toHaveBeenCalledOnce();
  });
});

test("a form is sent once, and its button stays in place while it is sent", async () => {
  let finish: () => void = () => undefined;
  const send = vi.fn(() => new Promise<void>((resolve) => (finish = resolve)));
  render(
    <form action={send}>
      <SubmitButton pendingLabel="Handing over">Hand over E1.1</SubmitButton>
    </form>,
  );
  await act(async () => fireEvent.click(screen.getByRole("button", { name: "Hand over E1.1" })));
  const sending = screen.getByRole("button", { name: "Handing over" });
  expect(sending.getAttribute("aria-disabled")).toBe("true");
  await act(async () => fireEvent.click(sending));
  expect(send).toHaveBeenCalledOnce();
  await act(async () => finish());
  expect(screen.getByRole("button", { name: "Hand over E1.1" }).getAttribute("type")).toBe(
    "submit",
  );
});
