import type { Metadata } from "next";
import { headers } from "next/headers";
import { Theme } from "@/components/frame/theme";
import "./fonts/fonts.css";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Riverline", template: "%s · Riverline" },
  description: "Failure analysis cases, from field return to signed findings.",
};

// A prerendered page could carry no nonce, and its scripts would be refused.
export const dynamic = "force-dynamic";

export default async function RootLayout({ children }: { children: React.ReactNode }) {
  const nonce = (await headers()).get("x-nonce") ?? "";
  return (
    <html lang="en" data-theme="auto" suppressHydrationWarning>
      <body>
        <Theme nonce={nonce}>{children}</Theme>
      </body>
    </html>
  );
}
