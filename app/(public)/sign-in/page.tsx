import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { currentActor } from "@/lib/auth/session";
import { env } from "@/lib/env";
import { openPage } from "@/lib/http/page";
import { laboratory } from "@/lib/people/laboratory";
import { routes } from "@/lib/routes";
import { SignInFrame } from "@/components/frame/sign-in-frame";
import { SignInForm } from "./_components/sign-in-form";

export const metadata: Metadata = { title: "Sign in" };

/** Only addresses inside the portal may be gone to after signing in. */
function safeNext(next: string | undefined): string {
  return next && /^\/(?![/\\])/.test(next) ? next : routes.cases();
}

export default async function SignInPage({
  searchParams,
}: {
  searchParams: Promise<{ next?: string }>;
}) {
  openPage();
  const next = safeNext((await searchParams).next);
  if (await currentActor()) redirect(next);
  const lab = await laboratory();
  if (!lab) redirect(routes.setUp());
  return (
    <SignInFrame
      title="Sign in"
      note={lab.name}
      below={<p>Sending parts for the first time? Ask the laboratory for an invitation.</p>}
    >
      <SignInForm next={next} />
      <p className="mt-6 border-t border-rule pt-4 text-13 text-ink-2">
        Signing a report asks for your password again. You are signed out after{" "}
        {env().SESSION_IDLE_MINUTES} minutes without use; drafts are kept.
      </p>
    </SignInFrame>
  );
}
