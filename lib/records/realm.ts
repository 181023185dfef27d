import type { Knex } from "knex";
import type { Environment } from "@/lib/keys/keyText";

/** Whose records are meant: an organisation's, of one of its environments. They never mix. */
export interface Realm {
  organisationId: string;
  environment: Environment;
}

export type RecordTable = "projects" | "instruments" | "calibrations" | "traverses" | "traverse_history" | "attachments" | "events" | "webhook_endpoints" | "deliveries" | "idempotency_keys" | "imports";

/** The columns that put a row into a realm. */
export const realmColumns = ({ organisationId, environment }: Realm): { organisation_id: string; environment: Environment } => ({ organisation_id: organisationId, environment });

/**
 * Starts every query of records: whatever follows, it sees one organisation's rows of one environment and no others.
 * Nothing else under `lib` names these tables in a query, and a test holds that.
 */
export const recordsOf = <Row extends object>(db: Knex, table: RecordTable, realm: Realm): Knex.QueryBuilder<Row, Row[]> =>
  db<Row>(table).where(Object.fromEntries(Object.entries(realmColumns(realm)).map(([column, value]) => [`${table}.${column}`, value]))) as Knex.QueryBuilder<Row, Row[]>;

/** Adds a row, or several in one statement, to a realm. */
export const addRecord = (db: Knex, table: RecordTable, realm: Realm, ...rows: Record<string, unknown>[]): Promise<unknown> => db(table).insert(rows.map((row) => ({ ...realmColumns(realm), ...row })));
