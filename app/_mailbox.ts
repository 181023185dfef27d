import { headers } from "next/headers";
import { isMailboxOpen } from "@/lib/mail/mailbox";

/** Whether the local mailbox is open to whoever asks for this page. */
export const mailboxIsOpen = async (): Promise<boolean> => isMailboxOpen((await headers()).get("host"));
