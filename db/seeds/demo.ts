import { randomInt } from "node:crypto";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import knex, { type Knex } from "knex";
import { knexConfig } from "@/knexfile";
import { hashPassword } from "@/lib/accounts/password";
import { newId } from "@/lib/ids/newId";
import { makeKeyText, type Environment } from "@/lib/keys/keyText";
import { seedRecords } from "./records";
import { seedUsage } from "./usage";

/** What the start command prints; kept in a file beside the data, because the database holds hashes only. */
export interface Demo {
  signIns: { role: string; email: string; password: string }[];
  sandboxKey: string;
}

interface Account {
  organisation: string;
  plan: string;
  people: { role: "owner" | "developer" | "viewer"; name: string; email: string }[];
  keys: { name: string; environment: Environment; scopes: string[]; share: number; daysAgo: number; revoked?: boolean }[];
  /** Requests on a busy weekday. */
  volume: number;
}

const CALCULATIONS = ["calculations"];
const EVERYTHING = ["calculations", "records:read", "records:write", "records:issue", "webhooks", "usage:read"];

/** All invented: the scenario of the product's description. */
const ACCOUNTS: Account[] = [
  {
    organisation: "Slateboard Software",
    plan: "practice",
    people: [
      { role: "owner", name: "Ottilie Varnholt", email: "owner@slateboard.example" },
      { role: "developer", name: "Bram Achterlund", email: "developer@slateboard.example" },
      { role: "viewer", name: "Sunniva Pell", email: "viewer@slateboard.example" },
    ],
    keys: [
      { name: "First calls", environment: "sandbox", scopes: EVERYTHING, share: 0.12, daysAgo: 24 },
      { name: "Field app", environment: "production", scopes: EVERYTHING, share: 0.62, daysAgo: 22 },
      { name: "Nightly report check", environment: "production", scopes: CALCULATIONS, share: 0.26, daysAgo: 19 },
      { name: "Prototype", environment: "sandbox", scopes: CALCULATIONS, share: 0, daysAgo: 40, revoked: true },
    ],
    volume: 1_900,
  },
  {
    organisation: "Tidewell Air Balance",
    plan: "trial",
    people: [{ role: "owner", name: "Rowena Okonjo-Lindqvist", email: "owner@tidewell.example" }],
    keys: [{ name: "Spreadsheet", environment: "sandbox", scopes: CALCULATIONS, share: 1, daysAgo: 20 }],
    volume: 140,
  },
  {
    organisation: "Kestrel Lane Commissioning",
    plan: "platform",
    people: [{ role: "owner", name: "Idris Fennimore", email: "owner@kestrel-lane.example" }],
    keys: [{ name: "Building data", environment: "production", scopes: EVERYTHING, share: 1, daysAgo: 30 }],
    volume: 5_200,
  },
];

const ADMINISTRATOR = { name: "Platform administrator", email: "administrator@averduct.example" };
const WORDS = ["plenum", "damper", "gauge", "ladder", "louvre", "flange", "sheave", "grille", "elbow", "riser", "coil", "filter", "baffle", "takeoff", "hanger", "gasket"];

/** Seeds the demo once, on an empty database; afterwards only reads back what to print. Null where it was seeded elsewhere. */
export async function seedDemo(databaseUrl: string, file: string): Promise<Demo | null> {
  const db = knex(knexConfig(databaseUrl));
  try {
    if (await db("organisations").first("id")) return existsSync(file) ? (JSON.parse(readFileSync(file, "utf8")) as Demo) : null;
    const demo = await db.transaction((transaction) => seedAll(transaction));
    writeFileSync(file, `${JSON.stringify(demo, null, 2)}\n`, { mode: 0o600 });
    return demo;
  } finally {
    await db.destroy();
  }
}

async function seedAll(db: Knex): Promise<Demo> {
  const signIns: Demo["signIns"] = [];
  const keyTexts: string[] = [];
  for (const account of ACCOUNTS) {
    const organisationId = newId("org");
    await db("organisations").insert({ id: organisationId, name: account.organisation, plan_id: account.plan, created_at: daysAgo(45) });
    let ownerId: string | null = null;
    for (const { role, name, email } of account.people) {
      const person = await seedPerson(db, name, email);
      ownerId ??= person.id;
      await db("memberships").insert({ organisation_id: organisationId, user_id: person.id, role });
      if (account === ACCOUNTS[0]) signIns.push({ role, email, password: person.password });
    }
    if (account === ACCOUNTS[0]) await seedRecords(db, { organisationId, environment: "sandbox" }, ownerId!);
    keyTexts.push(...(await seedKeys(db, organisationId, ownerId!, account)));
  }
  const administrator = await seedPerson(db, ADMINISTRATOR.name, ADMINISTRATOR.email, true);
  signIns.push({ role: "administrator", email: ADMINISTRATOR.email, password: administrator.password });
  return { signIns, sandboxKey: keyTexts[0]! };
}

async function seedPerson(db: Knex, name: string, email: string, isAdministrator = false): Promise<{ id: string; password: string }> {
  const id = newId("usr");
  const password = `${Array.from({ length: 3 }, () => WORDS[randomInt(WORDS.length)]).join("-")}-${randomInt(1000, 9999)}`;
  await db("users").insert({
    id, name, email, is_administrator: isAdministrator, password_hash: await hashPassword(password), email_verified_at: daysAgo(45), created_at: daysAgo(45),
  });
  return { id, password };
}

async function seedKeys(db: Knex, organisationId: string, ownerId: string, account: Account): Promise<string[]> {
  const texts: string[] = [];
  const shares: { id: string; environment: Environment; share: number }[] = [];
  for (const key of account.keys) {
    const { id, text, secretHash } = makeKeyText(key.environment);
    await db("api_keys").insert({
      id, organisation_id: organisationId, environment: key.environment, name: key.name, secret_hash: secretHash, ending: text.slice(-4),
      scopes: JSON.stringify(key.scopes), created_by: ownerId, created_at: daysAgo(key.daysAgo),
      revoked_at: key.revoked ? daysAgo(key.daysAgo - 12) : null,
      last_used_at: key.share > 0 ? daysAgo(0.02) : daysAgo(key.daysAgo - 11), last_used_from: "127.0.0.1",
    });
    texts.push(text);
    if (key.share > 0) shares.push({ id, environment: key.environment, share: key.share });
  }
  await seedUsage(db, organisationId, account.volume, shares);
  return texts;
}

const daysAgo = (days: number): Date => new Date(Date.now() - days * 86_400_000);
