import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Time } from "@/app/_components/format/Time";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { mailboxIsOpen } from "@/app/_mailbox";
import { listMail, type StoredMail } from "@/lib/mail/mailbox";

export const metadata: Metadata = { title: "Local mailbox", robots: { index: false } };

const LINK = /(https?:\/\/\S+)/;

export default async function MailboxPage() {
  if (!(await mailboxIsOpen())) notFound();
  const mails = await listMail();
  return (
    <main id="page" className="mx-auto grid w-full max-w-3xl gap-3 px-4 py-6">
      <PageHeader title="Local mailbox" back={{ href: "/", label: "Averduct" }}>
        E-mails that this installation would send, the newest first. With SMTP_URL set they are sent, and this page is gone.
      </PageHeader>
      {mails.length === 0 && <EmptyState title="No e-mails yet">Create an account or ask for a new password, and the e-mail appears here.</EmptyState>}
      {mails.map((mail, index) => (
        <Letter key={mail.id} mail={mail} open={index === 0} />
      ))}
    </main>
  );
}

/** One e-mail: its head, which opens it. */
function Letter({ mail: { recipient, subject, body, sentAt }, open }: { mail: StoredMail; open: boolean }) {
  return (
    <section className="min-w-0 border rounded-sheet bg-card">
      <details open={open}>
        <summary className="px-4 py-2.5">
          <h2 className="inline font-semibold">{subject}</h2>
          <span className="mt-0.5 flex flex-wrap justify-between gap-x-4 text-small text-muted">
            <span className="font-mono break-all">To {recipient}</span>
            <Time value={sentAt} />
          </span>
        </summary>
        <p className="border-t p-4 break-words whitespace-pre-wrap">
          {body.split(LINK).map((part, index) => (LINK.test(part) ? <a key={index} href={part} className="link break-all">{part}</a> : part))}
        </p>
      </details>
    </section>
  );
}
