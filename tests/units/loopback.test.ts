import { afterEach, describe, expect, it } from "vitest";
import { sessionCookie } from "@/lib/http/cookies";
import { callerNetwork } from "@/lib/accounts/allowance";
import { isMailboxOpen } from "@/lib/mail/mailbox";
import { withCaller } from "@/lib/runtime/caller";
import { readConfig } from "@/lib/runtime/config";
import { isLoopback } from "@/lib/runtime/loopback";

const CONFIG = Symbol.for("averduct.config");
const held = globalThis as unknown as Record<symbol, unknown>;

/** Has the process read its configuration from these variables. */
function configure(environment: Record<string, string>): void {
  held[CONFIG] = readConfig({ DATABASE_URL: "mysql://averduct@127.0.0.1:3306/averduct", ...environment });
}

afterEach(() => {
  delete held[CONFIG];
});

describe("this very machine", () => {
  it.each(["localhost", "LOCALHOST", "portal.localhost", "127.0.0.1", "127.200.3.4", "::1", "[::1]", "::ffff:127.0.0.1"])("is %s", (host) => expect(isLoopback(host)).toBe(true));
  it.each(["", "localhost.example", "127.0.0.1.example", "10.0.0.1", "192.0.2.1", "0.0.0.0", "fe80::1", "2001:db8::1", "::ffff:192.0.2.1"])("is not %j", (host) => expect(isLoopback(host)).toBe(false));
});

describe("the session cookie", () => {
  it.each([
    ["http://localhost:3000", false],
    ["http://127.0.0.1:3000", false],
    ["https://localhost", true],
    ["https://averduct.example", true],
    ["http://averduct.example", true],
    ["http://192.0.2.7:3000", true],
  ])("under %s: Secure %s", (url, secure) => {
    configure({ AVERDUCT_URL: url });
    expect(sessionCookie("token").includes("; Secure")).toBe(secure);
  });
});

describe("the local mailbox", () => {
  const openTo = (address: string, host: string | null): boolean => withCaller(address, () => isMailboxOpen(host));

  it("is open on this machine and under its own name only", () => {
    configure({});
    expect(openTo("127.0.0.1", "localhost:3000")).toBe(true);
    expect(openTo("::1", "[::1]:3000")).toBe(true);
    expect(openTo("192.0.2.7", "localhost:3000")).toBe(false);
    expect(openTo("127.0.0.1", "elsewhere.example:3000")).toBe(false);
    expect(openTo("127.0.0.1", null)).toBe(false);
    expect(isMailboxOpen("localhost:3000")).toBe(false);
  });

  it.each<Record<string, string>>([{ SMTP_URL: "smtp://127.0.0.1:2525" }, { AVERDUCT_MODE: "production", AVERDUCT_SECRET: "a text of our own with more than 32 characters" }])("is closed with %o", (environment) => {
    configure(environment);
    expect(openTo("127.0.0.1", "localhost:3000")).toBe(false);
  });
});

describe("the network that attempts are counted for", () => {
  it.each([
    ["192.0.2.7", "192.0.2.7"],
    ["::ffff:192.0.2.7", "192.0.2.7"],
    ["2001:db8:1:2:3:4:5:6", "2001:db8:1:2::"],
    ["2001:db8:1:2:ffff::1", "2001:db8:1:2::"],
    ["2001:db8:1:3::1", "2001:db8:1:3::"],
    ["not an address", "unknown"],
  ])("of %s is %s", (address, network) => {
    expect(withCaller(address, callerNetwork)).toBe(network);
  });
});
