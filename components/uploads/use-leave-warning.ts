"use client";

import { useEffect } from "react";

/** Has the browser ask before the page is left, while `isOn`. */
export function useLeaveWarning(isOn: boolean): void {
  useEffect(() => {
    if (!isOn) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [isOn]);
}
