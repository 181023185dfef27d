import pino, { type Logger } from "pino";
import { config } from "./config";
import { processWide } from "./processWide";

/** Structured log, one JSON object a line. Anything that could hold a secret is removed before it is written. */
export const log = (): Logger =>
  processWide("log", () =>
    pino({
      level: config().LOG_LEVEL,
      base: null,
      redact: {
        paths: ["authorization", "cookie", "password", "secret", "token", "*.authorization", "*.cookie", "*.password", "*.secret", "*.token"],
        censor: "[removed]",
      },
    }),
  );
