import { database } from "@/db/connection";
import { callerAddress } from "@/lib/runtime/caller";
import { config } from "@/lib/runtime/config";
import { isLoopback } from "@/lib/runtime/loopback";

export interface StoredMail {
  id: string;
  recipient: string;
  subject: string;
  body: string;
  sentAt: Date;
}

const MOST_SHOWN = 100;

/**
 * Whether whoever asks may read the e-mails kept here, with the links that open accounts: only where nothing real is
 * sent, only on this very machine, and only under its own name, which a page of another site cannot ask under.
 * @param host The request's Host header.
 */
export function isMailboxOpen(host: string | null): boolean {
  const { AVERDUCT_MODE, SMTP_URL } = config();
  return AVERDUCT_MODE === "local" && SMTP_URL === undefined && isLoopback(callerAddress() ?? "") && isLoopback(host?.replace(/:\d+$/, "") ?? "");
}

/** The newest e-mails of the local mailbox. */
export async function listMail(): Promise<StoredMail[]> {
  const rows = await database()("local_mailbox").orderBy("id", "desc").limit(MOST_SHOWN);
  return rows.map(({ id, recipient, subject, body, sent_at }) => ({ id, recipient, subject, body, sentAt: sent_at }));
}
