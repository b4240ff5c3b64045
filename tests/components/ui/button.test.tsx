import { afterEach, describe, expect, test, vi } from "vitest";
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { Button } from "@/components/ui/button";

afterEach(cleanup);

describe("a button that is not open now", () => {
  test("stays focusable and is described by its reason", () => {
    render(<Button disabledReason="Opens when all eight are met.">Send for sign-off</Button>);
    const button = screen.getByRole("button", { name: "Send for sign-off" });
    expect(button.getAttribute("aria-disabled")).toBe("true");
    expect(button.hasAttribute("disabled")).toBe(false);
    const reasonId = button.getAttribute("aria-describedby") ?? "";
    expect(document.getElementById(reasonId)?.textContent).toBe("Opens when all eight are met.");
  });

  test("neither acts nor sends its form", () => {
    const onClick = vi.fn();
    const onSubmit = vi.fn();
    render(
      <form onSubmit={onSubmit}>
        <Button type="submit" onClick={onClick} disabledReason="Issue 1 is signed.">
          Sign
        </Button>
      </form>,
    );
    fireEvent.click(screen.getByRole("button"));
    expect(onClick).not.toHaveBeenCalled();
    expect(onSubmit).not.toHaveBeenCalled();
  });
});

test("an open button acts, and does not send a form unless told to", () => {
  const onClick = vi.fn();
  render(<Button onClick={onClick}>Hand over E1.1</Button>);
  fireEvent.click(screen.getByRole("button", { name: "Hand over E1.1" }));
  expect(onClick).toHaveBeenCalledOnce();
  expect(screen.getByRole("button").getAttribute("type")).toBe("button");
});
