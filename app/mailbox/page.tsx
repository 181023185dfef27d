import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Time } from "@/app/_components/format/Time";
import { Card } from "@/app/_components/layout/Card";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { EmptyState } from "@/app/_components/mark/EmptyState";
import { isMailboxOpen, listMail } from "@/lib/mail/mailbox";

export const metadata: Metadata = { title: "Local mailbox", robots: { index: false } };

const LINK = /(https?:\/\/\S+)/;

export default async function MailboxPage() {
  if (!isMailboxOpen()) notFound();
  const mails = await listMail();
  return (
    <main id="page" className="mx-auto grid w-full max-w-3xl gap-4 px-4 py-6">
      <PageHeader title="Local mailbox" back={{ href: "/", label: "Averduct" }}>
        E-mails that this installation would send, the newest first. With SMTP_URL set they are sent, and this page is gone.
      </PageHeader>
      {mails.length === 0 && <EmptyState title="No e-mails yet">Create an account or ask for a new password, and the e-mail appears here.</EmptyState>}
      {mails.map(({ id, recipient, subject, body, sentAt }) => (
        <Card key={id} title={subject} aside={<Time value={sentAt} />}>
          <p className="mb-2 font-mono text-small text-muted">To {recipient}</p>
          <p className="break-words whitespace-pre-wrap">
            {body.split(LINK).map((part, index) => (LINK.test(part) ? <a key={index} href={part} className="link break-all">{part}</a> : part))}
          </p>
        </Card>
      ))}
    </main>
  );
}
