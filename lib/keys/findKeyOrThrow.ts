import { refusal } from "@/lib/problems/problem";
import { findKeySummary, type KeySummary } from "./listKeys";

/** A key of an organisation. Throws `not-found` for one it does not have, whoever else may have it. */
export async function findKeyOrThrow(organisationId: string, id: string): Promise<KeySummary> {
  const key = await findKeySummary(organisationId, id);
  if (key) return key;
  throw refusal("not-found", "Your organisation has no key with this id.", { parameter: "id" });
}
