import { damaged, type Finding } from "./finding";

/** ISO 32000-1:2008, 7.5.2 file header and 7.5.5 file trailer. */
const HEADER = /^%PDF-\d\.\d/;
const HEADER_BYTES = 8;
const TRAILER = /startxref\s+(\d+)\s+%%EOF[\s\0]*$/;
/** As far from the end as readers look for the trailer. */
const TRAILER_BYTES = 1_024;

export const isPdf = (bytes: Buffer): boolean => HEADER.test(bytes.toString("latin1", 0, HEADER_BYTES));

/** Looks at a PDF's end: the place of its cross-references, the end mark, and nothing after it. */
export function examinePdf(bytes: Buffer): Finding {
  const trailer = TRAILER.exec(bytes.toString("latin1", Math.max(0, bytes.length - TRAILER_BYTES)));
  if (!trailer || Number(trailer[1]) >= bytes.length) return damaged("The PDF does not end with its cross-references and %%EOF: it is cut off, or something was put after its end.");
  return null;
}
