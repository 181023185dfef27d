import { createServer, type AddressInfo, type Server } from "node:net";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { sendMail } from "@/lib/mail/sendMail";
import { readConfig } from "@/lib/runtime/config";

const held = globalThis as unknown as Record<symbol, unknown>;

/** As much of a mail server as RFC 5321 needs to take one message; what it was sent, line by line. */
function mailServer(received: string[]): Server {
  return createServer((socket) => {
    let inMessage = false;
    const say = (line: string): void => void socket.write(`${line}\r\n`);
    say("220 mail.example ready");
    let rest = "";
    socket.on("data", (chunk) => {
      const lines = (rest + chunk.toString()).split("\r\n");
      rest = lines.pop()!;
      for (const line of lines) {
        received.push(line);
        if (inMessage && line !== ".") continue;
        if (line === "DATA") {
          inMessage = true;
          say("354 go on");
        } else if (line === "QUIT") socket.end("221 bye\r\n");
        else {
          inMessage = false;
          say("250 done");
        }
      }
    });
  });
}

describe("an e-mail, where a mail server is configured", () => {
  const received: string[] = [];
  let server: Server;
  beforeEach(async () => {
    received.length = 0;
    server = mailServer(received);
    await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
    const { port } = server.address() as AddressInfo;
    held[Symbol.for("averduct.config")] = readConfig({
      DATABASE_URL: "mysql://averduct@127.0.0.1:3306/averduct", SMTP_URL: `smtp://127.0.0.1:${port}`, MAIL_FROM: "Averduct <no-reply@averduct.example>", LOG_LEVEL: "silent",
    });
  });
  afterEach(async () => {
    for (const name of ["averduct.config", "averduct.mailTransporter"]) delete held[Symbol.for(name)];
    await new Promise((resolve) => server.close(resolve));
  });

  it("goes to it as plain text, from and to whom it should", async () => {
    const link = `https://averduct.example/verify-email?token=${"a".repeat(43)}`;
    await sendMail({ to: "owner@slateboard.example", subject: "Confirm your e-mail address", text: `Open this page.\n\n${link}\n` });
    expect(received).toContain("MAIL FROM:<no-reply@averduct.example>");
    expect(received).toContain("RCPT TO:<owner@slateboard.example>");
    expect(received).toContain("Subject: Confirm your e-mail address");
    expect(received).toContain("Content-Type: text/plain; charset=utf-8");
    // Quoted-printable (RFC 2045) breaks a long line with "=" at its end and writes "=" as "=3D".
    const message = received.join("\r\n").replaceAll("=\r\n", "").replaceAll("=3D", "=");
    expect(message).toContain(link);
  });

  it("fails when the server refuses", async () => {
    server.removeAllListeners("connection");
    server.on("connection", (socket) => socket.end("554 no\r\n"));
    await expect(sendMail({ to: "owner@slateboard.example", subject: "Set a new password", text: "Open this page." })).rejects.toThrow();
  });
});
