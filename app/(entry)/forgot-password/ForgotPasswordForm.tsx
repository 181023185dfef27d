"use client";

import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { MailSent } from "../MailSent";

export function ForgotPasswordForm({ localMailbox }: { localMailbox: boolean }) {
  const [sent, setSent] = useState(false);
  const form = usePortalForm("auth/forgot-password", (fields) => ({ email: fields.get("email") }), () => setSent(true));
  if (sent) return <MailSent localMailbox={localMailbox}>If the address has an account, a link to set a new password was sent to it. The link is good for one hour, once.</MailSent>;
  return (
    <form onSubmit={form.submit} noValidate className="grid gap-4">
      <FormErrors errors={form.errors} />
      <TextInput name="email" type="email" label="E-mail" hint="We send a link to set a new password." autoComplete="username" required error={form.errorOf("email")} />
      <div>
        <Button type="submit" variant="primary" pending={form.pending}>
          Send the link
        </Button>
      </div>
    </form>
  );
}
