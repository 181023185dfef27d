"use client";

import Link from "next/link";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { MailSent } from "../MailSent";

export function SignUpForm({ localMailbox }: { localMailbox: boolean }) {
  const [sent, setSent] = useState(false);
  const form = usePortalForm(
    "auth/sign-up",
    (fields) => ({ name: fields.get("name"), organisation: fields.get("organisation"), email: fields.get("email"), password: fields.get("password") }),
    () => setSent(true),
  );
  if (sent) return <MailSent localMailbox={localMailbox}>Open the link in it to confirm the address and come in. The link is good for three days, once.</MailSent>;
  return (
    <form onSubmit={form.submit} noValidate className="grid gap-4">
      <FormErrors errors={form.errors} title="The account was not created" />
      <TextInput name="name" label="Your name" autoComplete="name" required error={form.errorOf("name")} />
      <TextInput name="organisation" label="Organisation" hint="The company whose software calls the API." autoComplete="organization" required error={form.errorOf("organisation")} />
      <TextInput name="email" type="email" label="E-mail" autoComplete="username" required error={form.errorOf("email")} />
      <TextInput name="password" type="password" label="Password" hint="At least 10 characters; a few unrelated words are good." autoComplete="new-password" required error={form.errorOf("password")} />
      <div>
        <Button type="submit" variant="primary" pending={form.pending}>
          Create the account
        </Button>
      </div>
      <p className="border-t pt-3 text-muted">
        Have an account?{" "}
        <Link href="/sign-in" className="link">
          Sign in
        </Link>
      </p>
    </form>
  );
}
