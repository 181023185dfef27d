import { database } from "@/db/connection";
import { config } from "@/lib/runtime/config";

export interface StoredMail {
  id: string;
  recipient: string;
  subject: string;
  body: string;
  sentAt: Date;
}

const MOST_SHOWN = 100;

/** Whether e-mails are kept here for anybody on this machine to read: only where nothing real is sent. */
export const isMailboxOpen = (): boolean => config().AVERDUCT_MODE === "local" && config().SMTP_URL === undefined;

/** The newest e-mails of the local mailbox. */
export async function listMail(): Promise<StoredMail[]> {
  const rows = await database()("local_mailbox").orderBy("id", "desc").limit(MOST_SHOWN);
  return rows.map(({ id, recipient, subject, body, sent_at }) => ({ id, recipient, subject, body, sentAt: sent_at }));
}
