import { cookies, headers } from "next/headers";
import { redirect } from "next/navigation";
import { cache } from "react";
import { findSignedIn, SESSION_COOKIE, type SignedIn } from "@/lib/accounts/session";
import type { Member } from "@/lib/http/portalOperation";

/** Who is signed in on this request, asked once however many components want to know. */
export const signedIn = cache(async (): Promise<SignedIn | null> => findSignedIn((await cookies()).get(SESSION_COOKIE)?.value));

/** The member who is signed in; everybody else is sent to the sign-in page and back. */
export async function requireSignedIn(): Promise<Member> {
  const person = await signedIn();
  if (person?.organisation) return person as Member;
  return person?.isAdministrator ? redirect("/admin") : redirect(await signInAddress());
}

/** The administrator who is signed in; members are sent to their portal. */
export async function requireAdministrator(): Promise<SignedIn> {
  const person = await signedIn();
  if (person?.isAdministrator) return person;
  return redirect(person ? "/overview" : await signInAddress());
}

async function signInAddress(): Promise<string> {
  const path = (await headers()).get("x-path") ?? "";
  return path.startsWith("/") ? `/sign-in?next=${encodeURIComponent(path)}` : "/sign-in";
}
