"use client";

import { Dialog as BaseDialog } from "@base-ui/react/dialog";
import type { ReactElement, ReactNode, RefObject } from "react";
import { buttonClasses } from "@/components/ui/button-look";
import { classNames } from "@/components/ui/class-names";
import { Shape } from "@/components/ui/shapes";

export interface DialogProps {
  /** A question or the act: "Withdraw M2?" */
  title: ReactNode;
  /** Quiet words after the title. */
  note?: ReactNode;
  description?: ReactNode;
  children?: ReactNode;
  /** The safe choice first, the act last. */
  footer?: ReactNode;
  /** The element that opens it; leave out where open is held by the caller. */
  trigger?: ReactElement;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  /** Takes the focus on opening; the safe choice. */
  initialFocus?: RefObject<HTMLElement | null>;
  /** 400 px for a question, 640 for a form, 928 for sign-off. */
  width?: "question" | "form" | "wide";
  /** Escape and a press outside leave, unless what was typed would be lost. */
  keepOpenOutside?: boolean;
}

const WIDTHS = { question: "max-w-[25rem]", form: "max-w-[40rem]", wide: "max-w-[58rem]" } as const;

export function Dialog({
  title,
  note,
  description,
  children,
  footer,
  trigger,
  open,
  onOpenChange,
  initialFocus,
  width = "question",
  keepOpenOutside = false,
}: DialogProps) {
  const question = width === "question";
  return (
    <BaseDialog.Root
      open={open}
      onOpenChange={onOpenChange}
      disablePointerDismissal={keepOpenOutside}
    >
      {trigger ? <BaseDialog.Trigger render={trigger} /> : null}
      <BaseDialog.Portal>
        <BaseDialog.Backdrop className="fixed inset-0 z-40 bg-scrim" />
        <BaseDialog.Popup
          initialFocus={initialFocus}
          className={classNames(
            "fixed top-1/2 left-1/2 z-50 flex max-h-[calc(100dvh-2rem)] w-[calc(100vw-2rem)] -translate-x-1/2 -translate-y-1/2 flex-col rounded-4 bg-surface text-ink shadow-lift-2",
            WIDTHS[width],
          )}
        >
          <div
            className={classNames(
              "flex items-baseline gap-3.5",
              question ? "px-[18px] pt-4" : "border-b border-rule-2 px-6 py-4",
            )}
          >
            <BaseDialog.Title
              className={question ? "text-16 font-head" : "text-19 font-head tracking-[-0.012em]"}
            >
              {title}
            </BaseDialog.Title>
            {note ? <span className="text-13 text-ink-3">{note}</span> : null}
            {question ? null : (
              <BaseDialog.Close
                aria-label="Close"
                className={classNames(
                  buttonClasses({ look: "quiet", icon: true }),
                  "ml-auto self-center text-ink-2",
                )}
              >
                <Shape name="cross" />
              </BaseDialog.Close>
            )}
          </div>
          <div
            className={classNames(
              "min-h-0 flex-1 overflow-y-auto",
              question ? "px-[18px] pt-1 pb-3" : "px-6 py-4",
            )}
          >
            {description ? (
              <BaseDialog.Description className="text-13 text-ink-2">
                {description}
              </BaseDialog.Description>
            ) : null}
            {children}
          </div>
          {footer ? (
            <div
              className={classNames(
                "flex flex-wrap items-center justify-end gap-2",
                question
                  ? "px-[18px] pb-4"
                  : "rounded-b-4 border-t border-rule-2 bg-surface-2 px-6 py-3.5",
              )}
            >
              {footer}
            </div>
          ) : null}
        </BaseDialog.Popup>
      </BaseDialog.Portal>
    </BaseDialog.Root>
  );
}
