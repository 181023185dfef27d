import { AsyncLocalStorage } from "node:async_hooks";
import { processWide } from "./processWide";

const callers = (): AsyncLocalStorage<string> => processWide("callers", () => new AsyncLocalStorage<string>());

/**
 * Handles a request with its caller's address at hand. The server, which alone sees the socket, says the address;
 * a header could be forged by whoever calls.
 */
export const withCaller = <T>(address: string, handle: () => T): T => callers().run(address, handle);

/** The address the current request came from; null outside a request. */
export const callerAddress = (): string | null => callers().getStore() ?? null;
