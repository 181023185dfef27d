import Link from "next/link";
import type { ReactNode } from "react";
import { Notice } from "@/app/_components/layout/Notice";

/** What stands in place of a form once an e-mail is on its way. */
export function MailSent({ localMailbox, children }: { localMailbox: boolean; children: ReactNode }) {
  return (
    <div className="grid gap-4">
      <Notice kind="good" title="An e-mail is on its way" live>
        {children}
      </Notice>
      {localMailbox && (
        <p className="text-muted">
          This installation keeps its e-mails to itself: read it in the{" "}
          <Link href="/mailbox" className="link">
            local mailbox
          </Link>
          .
        </p>
      )}
    </div>
  );
}
