import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { mailboxIsOpen } from "@/app/_mailbox";
import { ForgotPasswordForm } from "./ForgotPasswordForm";

export const metadata: Metadata = { title: "Forgotten the password" };

export default async function ForgotPasswordPage() {
  return (
    <PlainSheet title="Forgotten the password">
      <ForgotPasswordForm localMailbox={await mailboxIsOpen()} />
    </PlainSheet>
  );
}
