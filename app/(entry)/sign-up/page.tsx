import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { isMailboxOpen } from "@/lib/mail/mailbox";
import { SignUpForm } from "./SignUpForm";

export const metadata: Metadata = { title: "Create an account" };

export default function SignUpPage() {
  return (
    <PlainSheet title="Create an account">
      <SignUpForm localMailbox={isMailboxOpen()} />
    </PlainSheet>
  );
}
