import type { Metadata } from "next";
import { PlainSheet } from "@/app/_components/layout/PlainSheet";
import { SignInForm } from "./SignInForm";

export const metadata: Metadata = { title: "Sign in" };

/** Only a path of our own may be gone to after signing in. */
const ownPath = (path: string | undefined): string => (path && /^\/(?![/\\])/.test(path) ? path : "/overview");

export default async function SignInPage({ searchParams }: { searchParams: Promise<{ next?: string; reset?: string }> }) {
  const { next, reset } = await searchParams;
  return (
    <PlainSheet title="Sign in">
      <SignInForm next={ownPath(next)} passwordWasReset={reset !== undefined} />
    </PlainSheet>
  );
}
