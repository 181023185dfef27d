import { z } from "zod";
import { processWide } from "./processWide";

/** The secret that a fresh local installation works with; production refuses to start on it. */
const LOCAL_SECRET = "local-installation-only-change-me-before-production";

const settings = z.object({
  /** `local`: everything on this machine, demo data. `production`: real secrets and services are required. */
  AVERDUCT_MODE: z.enum(["local", "production"]).default("local"),
  AVERDUCT_SECRET: z.string().min(32, "must have at least 32 characters").default(LOCAL_SECRET),
  /** Address that links in e-mails and problem types begin with. */
  AVERDUCT_URL: z.url().default("http://localhost:3000"),
  DATABASE_URL: z.url({ protocol: /^mysql$/ }),
  DATABASE_POOL: z.coerce.number().int().min(1).max(200).default(10),
  /** SMTP server as a URL; left out, e-mails go to the local mailbox. */
  SMTP_URL: z.url({ protocol: /^smtps?$/ }).optional(),
  MAIL_FROM: z.string().default("Averduct <no-reply@averduct.example>"),
  /** Bucket for the files of records; left out, they are kept in OBJECTS_FOLDER. It belongs to one installation alone. */
  S3_BUCKET: z.string().regex(/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/, "must be the name of a bucket").optional(),
  S3_REGION: z.string().default("us-east-1"),
  /** Address of a service that speaks S3; left out, that of the region. */
  S3_ENDPOINT: z.url({ protocol: /^https?$/ }).optional(),
  /** Left out, the SDK looks where it usually does, such as the machine's role. */
  S3_ACCESS_KEY_ID: z.string().optional(),
  S3_SECRET_ACCESS_KEY: z.string().optional(),
  OBJECTS_FOLDER: z.string().default(".data/objects"),
  /** How many proxies in front may be trusted to name the caller in X-Forwarded-For. */
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(0),
  LOG_LEVEL: z.enum(["fatal", "error", "warn", "info", "debug", "trace", "silent"]).default("info"),
  HOST: z.string().default("127.0.0.1"),
  PORT: z.coerce.number().int().min(1).max(65535).default(3000),
});

export type Config = z.output<typeof settings>;

/** Thrown at start when an environment variable does not fit; the message lists each one. */
export class ConfigError extends Error {}

export function readConfig(environment: Record<string, string | undefined>): Config {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ""));
  const result = settings.safeParse(given);
  if (!result.success) {
    const lines = result.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
    throw new ConfigError(`These environment variables do not fit:\n${lines.join("\n")}`);
  }
  if (result.data.AVERDUCT_MODE === "production" && result.data.AVERDUCT_SECRET === LOCAL_SECRET) {
    throw new ConfigError("AVERDUCT_SECRET still has its local value. Set it to a random text of at least 32 characters.");
  }
  return result.data;
}

/** The process's configuration, read once. */
export const config = (): Config => processWide("config", () => readConfig(process.env));
