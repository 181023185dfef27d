import type { Transport } from "nodemailer";
import { database } from "@/db/connection";
import { newId } from "@/lib/ids/newId";

/** A nodemailer transport that keeps e-mails in the database, for an installation without a mail server. */
export const mailboxTransport: Transport = {
  name: "mailbox",
  version: "1",
  send(mail, done) {
    const { to, subject, text } = mail.data;
    const envelope = mail.message.getEnvelope();
    database()("local_mailbox")
      .insert({ id: newId("mail"), recipient: String(to), subject: String(subject), body: String(text) })
      .then(() => done(null, { envelope, messageId: mail.message.messageId() }), (error: Error) => done(error, null as never));
  },
};
