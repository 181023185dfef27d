import type { Knex } from "knex";

/** Columns that many tables share, so that a foreign key always has the type of what it refers to. */

/** A TypeID such as `org_01kbc…`: short ASCII, compared byte by byte. */
export const identifier = (table: Knex.CreateTableBuilder, name: string): Knex.ColumnBuilder => textColumn(table, name, 40);

/** Text of our own making: ASCII, compared byte by byte. */
export const textColumn = (table: Knex.CreateTableBuilder, name: string, length: number): Knex.ColumnBuilder =>
  table.specificType(name, `VARCHAR(${length}) CHARACTER SET ascii COLLATE ascii_bin`);

/** A moment in UTC, to the millisecond. */
export const moment = (table: Knex.CreateTableBuilder, name: string): Knex.ColumnBuilder => table.datetime(name, { precision: 3 });
