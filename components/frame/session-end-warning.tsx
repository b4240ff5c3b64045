"use client";

import { useRef } from "react";
import { useSessionClock, type SessionTimes } from "@/components/frame/use-session-clock";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { LinkButton } from "@/components/ui/link-button";

export interface SessionEndWarningProps extends SessionTimes {
  /** Where to sign in again and come back to this page. */
  signInHref: string;
}

/** Put once in the portal. Two minutes before the session ends it asks whether to stay. */
export function SessionEndWarning({ signInHref, ...times }: SessionEndWarningProps) {
  const { phase, unanswered, renew } = useSessionClock(times);
  const safeChoice = useRef<HTMLButtonElement>(null);
  const minutes = Math.max(1, Math.round((times.endsAfterMs - times.warnAfterMs) / 60_000));
  if (phase === "working") return null;
  if (phase === "ended") {
    return (
      <Dialog
        open
        keepOpenOutside
        title="You are signed out"
        description="There was no use for a while. What you typed is still on this page; sign in in a new window and come back to save it."
        footer={
          <>
            <LinkButton href={signInHref}>Leave this page</LinkButton>
            <LinkButton href={signInHref} target="_blank" look="primary">
              Sign in in a new window
            </LinkButton>
          </>
        }
      />
    );
  }
  return (
    <Dialog
      open
      keepOpenOutside
      onOpenChange={(open) => {
        if (!open) void renew();
      }}
      initialFocus={safeChoice}
      title="Stay signed in?"
      description={`You are signed out in ${minutes === 1 ? "1 minute" : `${minutes} minutes`} unless you stay. What you typed is kept.`}
      footer={
        <Button ref={safeChoice} look="primary" onClick={() => void renew()}>
          Stay signed in
        </Button>
      }
    >
      {unanswered ? (
        <p role="status" className="mt-2 text-13 text-warn">
          There was no answer. What you typed is kept on this page. Try again.
        </p>
      ) : null}
    </Dialog>
  );
}
