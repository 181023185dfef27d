import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { mailboxIsOpen } from "@/app/_mailbox";
import { SignUpForm } from "./SignUpForm";

export const metadata: Metadata = { title: "Create an account" };

export default async function SignUpPage() {
  return (
    <PlainSheet title="Create an account">
      <SignUpForm localMailbox={await mailboxIsOpen()} />
    </PlainSheet>
  );
}
