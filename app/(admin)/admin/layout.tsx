import type { ReactNode } from "react";
import { AppShell } from "@/app/_components/shell/AppShell";
import { SignOut } from "@/app/_components/shell/SignOut";
import { requireAdministrator } from "@/app/_session";

const NAV = [{ items: [{ href: "/admin", label: "Accounts", exact: true }, { href: "/admin/usage", label: "Usage" }] }];

export default async function AdminLayout({ children }: { children: ReactNode }) {
  const person = await requireAdministrator();
  return (
    <AppShell nav={NAV} place="Administration" person={person} signOut={<SignOut />}>
      {children}
    </AppShell>
  );
}
