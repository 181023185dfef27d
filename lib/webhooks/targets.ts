import dns from "node:dns";
import type { LookupFunction } from "node:net";
import ipaddr from "ipaddr.js";
import { config } from "@/lib/runtime/config";

/** Where webhooks may be sent: only to the public internet, or, in a local installation, anywhere. */
export type TargetPolicy = "public" | "any";

/** Thrown, or handed to whoever connects, for a target that the policy forbids. */
export class ForbiddenTarget extends Error {
  readonly code = "FORBIDDEN_TARGET";
}

/** Whether an address belongs to the public internet; an IPv4 address in IPv6 clothes counts as what it is. */
export const isPublicAddress = (address: string): boolean => ipaddr.isValid(address) && ipaddr.process(address).range() === "unicast";

/** Refuses what can be told from the URL alone. Names are looked at again as they are resolved. */
export function checkTarget(url: string, policy: TargetPolicy): void {
  const { protocol, hostname, username, password } = new URL(url);
  if (username !== "" || password !== "") throw new ForbiddenTarget("The URL must not hold a name or a password.");
  if (policy === "any") return;
  if (protocol !== "https:") throw new ForbiddenTarget("The URL must use https.");
  const host = hostname.replace(/^\[|\]$/g, "");
  if (ipaddr.isValid(host) && !isPublicAddress(host)) throw new ForbiddenTarget("The URL must not point to a private or special address.");
}

type Resolve = (hostname: string, options: dns.LookupAllOptions, done: (error: NodeJS.ErrnoException | null, addresses: dns.LookupAddress[]) => void) => void;

/**
 * Resolves a name for one connection and lets it have public addresses only. The connection goes to the very addresses
 * that were looked at, so a name that resolves to something else a moment later gains nothing by it.
 */
export const publicLookup = (resolve: Resolve = dns.lookup): LookupFunction => (hostname, options, done) => {
  resolve(hostname, { ...options, all: true } as dns.LookupAllOptions, (error, addresses) => {
    const forbidden = addresses?.some(({ address }) => !isPublicAddress(address));
    const [first] = addresses ?? [];
    if (error) return done(error, []);
    if (forbidden || !first) return done(new ForbiddenTarget("The name resolves to a private or special address."), []);
    return options.all ? done(null, addresses) : done(null, first.address, first.family);
  });
};

/** What this installation allows. */
export const targetPolicy = (): TargetPolicy => (config().AVERDUCT_MODE === "production" ? "public" : "any");
