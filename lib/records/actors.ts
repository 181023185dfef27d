import type { RecordContext } from "./context";

/** Names of the keys and people that a history mentions, by their ids. */
export async function namesOf({ db, realm }: Pick<RecordContext, "db" | "realm">, entries: { apiKeyId: string | null; userId: string | null }[]): Promise<Map<string, string>> {
  const ids = (name: "apiKeyId" | "userId"): string[] => [...new Set(entries.flatMap((entry) => entry[name] ?? []))];
  const keys: { id: string; name: string }[] = await db("api_keys").whereIn("id", ids("apiKeyId")).where("organisation_id", realm.organisationId).select("id", "name");
  const people: { id: string; name: string }[] = await db("users").whereIn("id", ids("userId")).select("id", "name");
  return new Map([...keys.map(({ id, name }) => [id, `key ${name}`] as const), ...people.map(({ id, name }) => [id, name] as const)]);
}
