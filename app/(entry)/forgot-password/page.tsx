import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { isMailboxOpen } from "@/lib/mail/mailbox";
import { ForgotPasswordForm } from "./ForgotPasswordForm";

export const metadata: Metadata = { title: "Forgotten the password" };

export default function ForgotPasswordPage() {
  return (
    <PlainSheet title="Forgotten the password">
      <ForgotPasswordForm localMailbox={isMailboxOpen()} />
    </PlainSheet>
  );
}
