import ipaddr from "ipaddr.js";

/** Whether an address or a host name means this very machine. */
export function isLoopback(host: string): boolean {
  const name = host.replace(/^\[|\]$/g, "").toLowerCase();
  if (name === "localhost" || name.endsWith(".localhost")) return true;
  return ipaddr.isValid(name) && ipaddr.process(name).range() === "loopback";
}
