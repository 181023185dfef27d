const AWAY_CODES = new Set([
  "ECONNREFUSED", "ECONNRESET", "ETIMEDOUT", "EPIPE", "ENOTFOUND", "PROTOCOL_CONNECTION_LOST",
  "ER_CON_COUNT_ERROR", "ER_SERVER_SHUTDOWN", "ER_TOO_MANY_USER_CONNECTIONS", "ER_CONNECTION_KILLED",
]);

/** Whether an error means that the database cannot be reached now, rather than that a query was wrong. */
export function isDatabaseAway(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  const code = "code" in error ? String(error.code) : "";
  return AWAY_CODES.has(code) || error.name === "KnexTimeoutError";
}
