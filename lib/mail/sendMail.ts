import nodemailer, { type Transporter } from "nodemailer";
import { config } from "@/lib/runtime/config";
import { log } from "@/lib/runtime/log";
import { processWide } from "@/lib/runtime/processWide";
import { mailboxTransport } from "./mailboxTransport";

export interface Mail {
  to: string;
  subject: string;
  text: string;
}

/** A mail server that does not answer is given up on; the package would wait for up to ten minutes. */
const PATIENCE = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 30_000 };

const transporter = (): Transporter =>
  processWide("mailTransporter", () => {
    const { SMTP_URL, MAIL_FROM } = config();
    return SMTP_URL ? nodemailer.createTransport({ url: SMTP_URL, ...PATIENCE }, { from: MAIL_FROM }) : nodemailer.createTransport(mailboxTransport, { from: MAIL_FROM });
  });

/** Sends an e-mail, through SMTP where it is configured and into the local mailbox otherwise. */
export async function sendMail(mail: Mail): Promise<void> {
  await transporter().sendMail(mail);
  log().info({ subject: mail.subject }, "e-mail sent");
}
