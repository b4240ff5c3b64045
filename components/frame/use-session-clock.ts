"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { routes } from "@/lib/routes";

export interface SessionTimes {
  /** Without use for this long: the warning. */
  warnAfterMs: number;
  /** Without use for this long: signed out. */
  endsAfterMs: number;
  /** The session is renewed at most this often while the person works. */
  renewEveryMs?: number;
}

export type SessionPhase = "working" | "warning" | "ended";

const LOOK_EVERY_MS = 1_000;
const CHANNEL = "riverline-session";
const USES = ["pointerdown", "keydown", "wheel", "touchstart"] as const;

/** Asks for the session, which prolongs it. True while there is one; throws without an answer. */
async function renewSession(): Promise<boolean> {
  const answer = await fetch(routes.api.session(), { cache: "no-store" });
  if (answer.status === 401) return false;
  if (!answer.ok) throw new Error(`The session was not renewed: status ${answer.status}`);
  return true;
}

/** Follows use of the page, renews the session while there is use, and says when it nears its end.
 *  Use in one window counts for all windows of the same browser. */
export function useSessionClock({ warnAfterMs, endsAfterMs, renewEveryMs = 60_000 }: SessionTimes) {
  const [phase, setPhase] = useState<SessionPhase>("working");
  const [unanswered, setUnanswered] = useState(false);
  const renewedAt = useRef(0);
  const asking = useRef(false);
  const channel = useRef<BroadcastChannel | null>(null);

  const renew = useCallback(async () => {
    if (asking.current) return;
    asking.current = true;
    try {
      const isSignedIn = await renewSession();
      setUnanswered(false);
      if (isSignedIn) {
        renewedAt.current = Date.now();
        channel.current?.postMessage("renewed");
      }
      setPhase(isSignedIn ? "working" : "ended");
    } catch {
      // No answer is not the end of the session: the clock runs on, and the dialog says so.
      setUnanswered(true);
    } finally {
      asking.current = false;
    }
  }, []);

  useEffect(() => {
    renewedAt.current = Date.now();
    channel.current = new BroadcastChannel(CHANNEL);
    channel.current.onmessage = () => {
      renewedAt.current = Date.now();
      setPhase("working");
    };
    // This page came from the server just now, so the session is fresh for the other windows too.
    channel.current.postMessage("renewed");
    const look = () => {
      const unusedMs = Date.now() - renewedAt.current;
      if (unusedMs >= endsAfterMs) setPhase("ended");
      else if (unusedMs >= warnAfterMs) setPhase((now) => (now === "ended" ? now : "warning"));
    };
    const onUse = () => {
      const unusedMs = Date.now() - renewedAt.current;
      if (unusedMs >= renewEveryMs && unusedMs < warnAfterMs) void renew();
    };
    const timer = setInterval(look, LOOK_EVERY_MS);
    for (const use of USES) window.addEventListener(use, onUse, { passive: true });
    return () => {
      clearInterval(timer);
      for (const use of USES) window.removeEventListener(use, onUse);
      channel.current?.close();
      channel.current = null;
    };
  }, [warnAfterMs, endsAfterMs, renewEveryMs, renew]);

  return { phase, unanswered, renew };
}
