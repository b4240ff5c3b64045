import type { Metadata } from "next";
import { SignInFrame } from "@/components/frame/sign-in-frame";
import { openPage } from "@/lib/http/page";
import { laboratory } from "@/lib/people/laboratory";
import { ForgottenForm } from "./forgotten-form";

export const metadata: Metadata = { title: "Forgotten password" };

export default async function ForgottenPage() {
  openPage();
  return (
    <SignInFrame title="Forgotten password" note={(await laboratory())?.name}>
      <ForgottenForm />
    </SignInFrame>
  );
}
