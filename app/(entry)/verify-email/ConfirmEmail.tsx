"use client";

import Link from "next/link";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";

/** The link is used by pressing the button, so that a mail program that looks at links does not use it up. */
export function ConfirmEmail({ token }: { token: string }) {
  const form = usePortalForm("auth/verify-email", () => ({ token }), () => window.location.assign("/overview"));
  const errors = form.errors.map(({ message }) => ({ message }));
  return (
    <form onSubmit={form.submit} className="grid gap-4">
      <FormErrors errors={errors} title="The address is not confirmed" />
      <p>Press the button to confirm that this address is yours. You are then signed in.</p>
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" variant="primary" pending={form.pending}>
          Confirm
        </Button>
        {errors.length > 0 && (
          <Link href="/sign-in" className="link">
            Sign in and have a new link sent
          </Link>
        )}
      </div>
    </form>
  );
}
