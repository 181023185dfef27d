"use client";

import Link from "next/link";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";

export function ResetPasswordForm({ token }: { token: string }) {
  const form = usePortalForm("auth/reset-password", (fields) => ({ token, password: fields.get("password") }), () => window.location.assign("/sign-in?reset"));
  const errors = form.errors.map(({ field, message }) => ({ field: field === "token" ? undefined : field, message }));
  return (
    <form onSubmit={form.submit} noValidate className="grid gap-4">
      <FormErrors errors={errors} title="The password was not set" />
      <TextInput name="password" type="password" label="New password" hint="At least 10 characters. Every session ends; sign in again with the new one." autoComplete="new-password" required error={form.errorOf("password")} />
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" variant="primary" pending={form.pending}>
          Set the password
        </Button>
        <Link href="/forgot-password" className="link">
          Ask for a new link
        </Link>
      </div>
    </form>
  );
}
