"use client";

import { Toast } from "@base-ui/react/toast";
import { useMemo, type ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import { Shape } from "@/components/ui/shapes";

const SHOWN_MS = 10_000;
const AT_MOST = 2;

export interface ToastWords {
  /** What happened: "E1.1 handed to Tove Brandt, 09:40." Never an error; those stay in the page. */
  text: string;
  kind?: "done" | "attention";
  action?: { label: string; onAct: () => void };
}

/** Shows a toast; with `action: { label: "Undo", ... }` it can be taken back for 10 seconds. */
export function useToasts(): { show: (words: ToastWords) => void } {
  const { add, close } = Toast.useToastManager();
  return useMemo(
    () => ({
      show({ text, kind = "done", action }: ToastWords) {
        const id = add({
          description: text,
          type: kind,
          actionProps: action && {
            children: action.label,
            onClick: () => {
              action.onAct();
              close(id);
            },
          },
        });
      },
    }),
    [add, close],
  );
}

function ToastList() {
  const { toasts } = Toast.useToastManager();
  return toasts.map((toast) => (
    <Toast.Root
      key={toast.id}
      toast={toast}
      role="group"
      className="rounded-4 bg-surface text-13 leading-[1.125rem] shadow-lift-2 data-limited:hidden"
    >
      <Toast.Content className="flex items-start gap-2.5 px-3 py-2.5">
        <Shape
          name={toast.type === "attention" ? "triangle" : "tick"}
          className={classNames(
            "mt-px shrink-0",
            toast.type === "attention" ? "text-warn" : "text-met",
          )}
        />
        <Toast.Description className="flex-1" />
        {toast.actionProps ? (
          <Toast.Action className="min-h-6 whitespace-nowrap text-action underline underline-offset-3" />
        ) : null}
        <Toast.Close aria-label="Close" className="grid size-6 place-items-center text-ink-3">
          <Shape name="cross" size={14} />
        </Toast.Close>
      </Toast.Content>
    </Toast.Root>
  ));
}

/** Put once around the pages: bottom left, at most two, read out politely. */
export function Toasts({ children }: { children: ReactNode }) {
  return (
    <Toast.Provider timeout={SHOWN_MS} limit={AT_MOST}>
      {children}
      <Toast.Portal>
        <Toast.Viewport
          role="status"
          className="no-print fixed bottom-4 left-4 z-50 flex w-[min(22rem,calc(100vw-2rem))] flex-col gap-2.5"
        >
          <ToastList />
        </Toast.Viewport>
      </Toast.Portal>
    </Toast.Provider>
  );
}
