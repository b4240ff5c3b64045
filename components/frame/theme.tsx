"use client";

import { ThemeProvider } from "next-themes";
import type { ReactNode } from "react";

/** Holds light, dark or the system's choice, on this device, in data-theme of the html element. */
export function Theme({ nonce, children }: { nonce?: string; children: ReactNode }) {
  return (
    <ThemeProvider
      attribute="data-theme"
      defaultTheme="system"
      enableSystem
      enableColorScheme={false}
      disableTransitionOnChange
      nonce={nonce}
    >
      {children}
    </ThemeProvider>
  );
}
