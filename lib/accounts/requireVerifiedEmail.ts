import { refusal } from "@/lib/problems/problem";
import type { SignedIn } from "./session";

/** Throws where the e-mail address has not been confirmed: an account must be somebody's before it has keys. */
export function requireVerifiedEmail({ email, emailVerified }: SignedIn): void {
  if (emailVerified) return;
  throw refusal("email-not-verified", `Confirm ${email} first: open the link in the e-mail, or have it sent again.`);
}
