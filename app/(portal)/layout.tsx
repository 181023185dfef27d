import type { ReactNode } from "react";
import { Notice } from "@/app/_components/layout/Notice";
import { AppShell } from "@/app/_components/shell/AppShell";
import { SignOut } from "@/app/_components/shell/SignOut";
import { requireSignedIn } from "@/app/_session";
import { ResendVerification } from "./ResendVerification";

const NAV = [
  { items: [{ href: "/overview", label: "Overview" }, { href: "/keys", label: "Keys" }, { href: "/usage", label: "Usage" }] },
  { heading: "For reference", items: [{ href: "/docs/reference", label: "API reference" }, { href: "/docs", label: "Docs", exact: true }] },
];

export default async function PortalLayout({ children }: { children: ReactNode }) {
  const person = await requireSignedIn();
  return (
    <AppShell nav={NAV} place={person.organisation.name} person={person} signOut={<SignOut />}>
      <div className="grid gap-4">
        {!person.emailVerified && <ResendVerification email={person.email} />}
        {person.organisation.suspendedAt && (
          <Notice kind="failure" title="This organisation is suspended">
            Its keys are refused until an administrator lifts the suspension.
          </Notice>
        )}
      </div>
      {children}
    </AppShell>
  );
}
