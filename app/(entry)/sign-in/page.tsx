import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { Notice } from "@/app/_components/layout/Notice";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { signedIn } from "@/app/_session";
import { ownPath } from "@/lib/http/ownPath";
import { SignInForm } from "./SignInForm";

export const metadata: Metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: PageProps<"/sign-in">) {
  const { next, reset } = await searchParams;
  const target = ownPath(next, "/overview");
  const person = await signedIn();
  if (person?.organisation || person?.isAdministrator) redirect(target);
  return (
    <PlainSheet title="Sign in">
      <div className="grid gap-4">
        {person && (
          <Notice kind="caution" title="No organisation">
            You are signed in as {person.email}, who belongs to no organisation any more. Ask an owner to invite you, or sign in as somebody else.
          </Notice>
        )}
        <SignInForm next={target} passwordWasReset={reset !== undefined} />
      </div>
    </PlainSheet>
  );
}
