import type { Metadata } from "next";
import Link from "next/link";
import { SignInFrame } from "@/components/frame/sign-in-frame";
import { Notice } from "@/components/ui/notice";
import { openPage } from "@/lib/http/page";
import { findToken } from "@/lib/people/person-token";
import { routes } from "@/lib/routes";
import { SetPasswordForm } from "./set-password-form";

export const metadata: Metadata = { title: "Choose a password", referrer: "no-referrer" };

export default async function SetPasswordPage({ params }: { params: Promise<{ token: string }> }) {
  openPage();
  const { token } = await params;
  const found = await findToken(token);
  return (
    <SignInFrame title="Choose a password" note={found?.name}>
      {found ? (
        <SetPasswordForm token={token} email={found.email} />
      ) : (
        <Notice
          kind="bad"
          title="This link has been used or is too old"
          actions={<Link href={routes.forgotten()}>Ask for a new one</Link>}
        >
          Nothing was changed.
        </Notice>
      )}
    </SignInFrame>
  );
}
