import { typeid } from "typeid-js";

/** What an id's prefix says it identifies. */
export type IdPrefix = "org" | "usr" | "ses" | "emt" | "inv" | "key" | "req" | "mail" | "aud" | "prj" | "ins" | "cal" | "trv" | "att" | "whe" | "evt" | "dlv" | "his" | "imp";

/** A new TypeID: a prefix and a UUIDv7, so that ids sort by the time they were made. */
export const newId = (prefix: IdPrefix): string => typeid(prefix).toString();
