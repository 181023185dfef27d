import type { Knex } from "knex";
import type { Environment } from "@/lib/keys/keyText";

const DAYS = 21;
const DAY_MS = 86_400_000;
const HOUR_MS = 3_600_000;
const ROWS_PER_INSERT = 500;

/** How the demo's requests divide over operations, and what one takes. */
const OPERATIONS = [
  { operation: "airflow", share: 0.58, microseconds: 420 },
  { operation: "averageVelocity", share: 0.16, microseconds: 310 },
  { operation: "airDensity", share: 0.12, microseconds: 190 },
  { operation: "ductArea", share: 0.09, microseconds: 150 },
  { operation: "densityCorrection", share: 0.05, microseconds: 170 },
];
const REFUSED_SHARE = 0.024;
/** How a working day's requests spread over its hours in UTC: mornings on the ladder, the arithmetic in the afternoon. */
const HOURS = [0, 0, 0, 0, 0, 0, 1, 3, 6, 8, 9, 8, 5, 8, 11, 12, 10, 8, 5, 3, 2, 1, 0, 0];
const HOURS_TOTAL = HOURS.reduce((sum, weight) => sum + weight, 0);

/** Three weeks of believable usage: quiet weekends, a slow rise, one bad Thursday with many refused requests. */
export async function seedUsage(db: Knex, organisationId: string, volume: number, keys: { id: string; environment: Environment; share: number }[]): Promise<void> {
  const random = randomFrom(volume);
  const today = Math.floor(Date.now() / DAY_MS) * DAY_MS;
  const rows: object[] = [];
  for (let day = DAYS - 1; day >= 0; day -= 1) {
    const midnight = today - day * DAY_MS;
    const weekday = new Date(midnight).getUTCDay();
    const requests = volume * (weekday === 0 || weekday === 6 ? 0.11 : 1) * (1 - 0.012 * day) * (0.85 + 0.3 * random());
    const refusedShare = day > 7 && day < 15 && weekday === 4 ? 0.19 : REFUSED_SHARE;
    for (const [hour, weight] of HOURS.entries()) {
      const at = midnight + hour * HOUR_MS + Math.floor(random() * 60) * 60_000;
      if (weight === 0 || at > Date.now()) continue;
      rows.push(...hourRows(organisationId, new Date(at), (requests * weight) / HOURS_TOTAL, refusedShare, keys, random));
    }
  }
  for (let from = 0; from < rows.length; from += ROWS_PER_INSERT) await db("usage_minutes").insert(rows.slice(from, from + ROWS_PER_INSERT));
}

function hourRows(organisationId: string, minute: Date, requests: number, refusedShare: number, keys: { id: string; environment: Environment; share: number }[], random: () => number): object[] {
  const rows: object[] = [];
  for (const key of keys) {
    for (const { operation, share, microseconds } of OPERATIONS) {
      const count = Math.round(requests * key.share * share * (0.8 + 0.4 * random()));
      const refused = Math.round(count * refusedShare * 2 * random());
      for (const [status, part] of [[200, count - refused], [422, refused]] as const) {
        if (part <= 0) continue;
        rows.push({
          organisation_id: organisationId, minute, api_key_id: key.id, environment: key.environment, operation, status,
          requests: part, items: part, microseconds: Math.round(part * microseconds * (0.8 + 0.5 * random())), slowest_microseconds: Math.round(microseconds * (2 + 8 * random())),
        });
      }
    }
  }
  return rows;
}

/** A small seeded generator (mulberry32), so that a demo looks the same wherever it is made. */
function randomFrom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}
