import { z } from "zod";

/** The parts that all operations on records share. */

const LONGEST_PAGE = 200;
const USUAL_PAGE = 50;

/** Id of a record: its kind's prefix and 26 characters. */
export const recordId = (prefix: string, words: string) =>
  z.string().regex(new RegExp(`^${prefix}_[0-7][0-9a-hjkmnp-tv-z]{25}$`), `Not the id of ${words}: it begins with ${prefix}_.`).describe(`Id of ${words}.`);

export const projectId = recordId("prj", "a project");
export const instrumentId = recordId("ins", "an instrument");
export const calibrationId = recordId("cal", "a calibration");
export const traverseId = recordId("trv", "a traverse");

export const moment = z.iso.datetime({ offset: true }).describe("ISO 8601 with its offset, e.g. 2026-11-30T14:05:00Z.");
export const day = z.iso.date().describe("A date, e.g. 2026-11-30.");
/** A line of text: trimmed, not empty. */
export const line = (most: number) => z.string().trim().min(1).max(most);

/** A shape of its own name, or null. (A `nullable()` one would lose its null behind the reference in the document.) */
export const orNull = <Schema extends z.ZodType>(schema: Schema) => z.union([schema, z.null()]);

/** Paging by keyset: as fast on the thousandth page as on the first. */
export const pageQuery = {
  limit: z.coerce.number().int().min(1).max(LONGEST_PAGE).default(USUAL_PAGE).describe(`Items on a page, at most ${LONGEST_PAGE}.`),
  after: z.string().max(300).optional().describe("`next` of the page before."),
};

/** A page of a list. */
export const page = <Item extends z.ZodType>(item: Item) =>
  z.strictObject({
    items: z.array(item),
    next: z.string().nullable().describe("Send it as `after` for the next page; null on the last."),
  });

export const times = {
  createdAt: moment,
  updatedAt: moment,
};
