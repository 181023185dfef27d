import type { Knex } from "knex";
import type { Realm } from "./realm";

/** Who does something to a record: a program by its key, or a person in the portal. */
export interface Actor {
  apiKeyId?: string;
  userId?: string;
}

/** Everything that work on records is given: the transaction it is part of, whose records, who does it. */
export interface RecordContext {
  db: Knex;
  realm: Realm;
  by: Actor;
}
