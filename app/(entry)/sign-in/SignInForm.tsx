"use client";

import Link from "next/link";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { Notice } from "@/app/_components/layout/Notice";

export function SignInForm({ next, passwordWasReset }: { next: string; passwordWasReset: boolean }) {
  const form = usePortalForm(
    "auth/sign-in",
    (fields) => ({ email: fields.get("email"), password: fields.get("password") }),
    // A full load: everything the page knows of who is signed in is asked anew.
    () => window.location.assign(next),
  );
  return (
    <form onSubmit={form.submit} noValidate className="grid gap-4">
      {passwordWasReset && <Notice kind="good">The new password is set. Sign in with it.</Notice>}
      <FormErrors errors={form.errors} title="You are not signed in" />
      <TextInput name="email" type="email" label="E-mail" autoComplete="username" required error={form.errorOf("email")} />
      <TextInput name="password" type="password" label="Password" autoComplete="current-password" required error={form.errorOf("password")} />
      <div className="flex flex-wrap items-center justify-between gap-3">
        <Button type="submit" variant="primary" pending={form.pending}>
          Sign in
        </Button>
        <Link href="/forgot-password" className="link">
          Forgotten the password
        </Link>
      </div>
      <p className="border-t pt-3 text-muted">
        No account yet?{" "}
        <Link href="/sign-up" className="link">
          Create an account
        </Link>
      </p>
    </form>
  );
}
