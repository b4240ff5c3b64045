import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SignInFrame } from "@/components/frame/sign-in-frame";
import { openPage } from "@/lib/http/page";
import { laboratory } from "@/lib/people/laboratory";
import { routes } from "@/lib/routes";
import { SetUpForm } from "./set-up-form";

export const metadata: Metadata = { title: "Set up" };

export default async function SetUpPage() {
  openPage();
  if (await laboratory()) redirect(routes.signIn());
  return (
    <SignInFrame
      title="Set up Riverline"
      note="This installation is empty. You become its first administrator and invite the others."
    >
      <SetUpForm />
    </SignInFrame>
  );
}
