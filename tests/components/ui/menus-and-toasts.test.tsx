import { afterEach, describe, expect, test, vi } from "vitest";
import { act, cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { Menu, MenuItem, MenuRule } from "@/components/ui/menu";
import { Toasts, useToasts } from "@/components/ui/toasts";
import { Button } from "@/components/ui/button";

afterEach(cleanup);

test("a menu opens, acts, and gives the reason for what is not open", async () => {
  const onEdit = vi.fn();
  const onWithdraw = vi.fn();
  render(
    <Menu trigger={<Button>More</Button>}>
      <MenuItem keys="E" onSelect={onEdit}>
        Edit points
      </MenuItem>
      <MenuRule />
      <MenuItem danger disabledReason="Issue 1 is signed" onSelect={onWithdraw}>
        Withdraw
      </MenuItem>
    </Menu>,
  );
  fireEvent.click(screen.getByRole("button", { name: "More" }));
  const withdraw = await screen.findByRole("menuitem", { name: /Withdraw/ });
  expect(withdraw.getAttribute("aria-disabled")).toBe("true");
  expect(withdraw.textContent).toContain("Issue 1 is signed");
  fireEvent.click(withdraw);
  expect(onWithdraw).not.toHaveBeenCalled();
  fireEvent.click(screen.getByRole("menuitem", { name: /Edit points/ }));
  expect(onEdit).toHaveBeenCalledOnce();
});

describe("toasts", () => {
  function HandOver({ onUndo }: { onUndo: () => void }) {
    const { show } = useToasts();
    return (
      <Button
        onClick={() =>
          show({ text: "E1.1 handed to Tove Brandt.", action: { label: "Undo", onAct: onUndo } })
        }
      >
        Hand over
      </Button>
    );
  }

  test("are read out politely and can be taken back once", async () => {
    const onUndo = vi.fn();
    render(
      <Toasts>
        <HandOver onUndo={onUndo} />
      </Toasts>,
    );
    fireEvent.click(screen.getByRole("button", { name: "Hand over" }));
    const area = screen.getByRole("status");
    await waitFor(() => expect(area.textContent).toContain("E1.1 handed to Tove Brandt."));
    await act(async () => {
      fireEvent.click(screen.getByRole("button", { name: "Undo" }));
    });
    expect(onUndo).toHaveBeenCalledOnce();
    await waitFor(() => expect(screen.queryByRole("button", { name: "Undo" })).toBeNull());
  });
});
