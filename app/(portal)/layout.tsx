import type { ReactNode } from "react";
import { Notice } from "@/app/_components/layout/Notice";
import { AppShell } from "@/app/_components/shell/AppShell";
import { EnvironmentChoice } from "@/app/_components/shell/EnvironmentChoice";
import { SignOut } from "@/app/_components/shell/SignOut";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { ResendVerification } from "./ResendVerification";

const NAV = [
  { items: [{ href: "/overview", label: "Overview" }, { href: "/bench", label: "Bench" }, { href: "/keys", label: "Keys" }, { href: "/usage", label: "Usage" }] },
  {
    heading: "Records",
    items: [
      { href: "/records", label: "Traverses" }, { href: "/projects", label: "Projects" }, { href: "/instruments", label: "Instruments" },
      { href: "/imports", label: "Imports" }, { href: "/webhooks", label: "Webhooks" },
    ],
  },
  { heading: "For reference", items: [{ href: "/docs/reference", label: "API reference" }, { href: "/docs", label: "Docs", exact: true }] },
];

export default async function PortalLayout({ children }: { children: ReactNode }) {
  const person = await requireSignedIn();
  const { realm } = await readingOf(person);
  return (
    <AppShell nav={NAV} place={person.organisation.name} person={person} aside={<EnvironmentChoice chosen={realm.environment} />} signOut={<SignOut />}>
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
