import { crc32 } from "node:zlib";
import { damaged, dataAfterEnd, type Finding } from "./finding";

/** PNG (Third Edition), W3C 2025: 5.2 signature, 5.3 chunk layout, 5.6 order of chunks, 11.2.1 IHDR. */
const SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
const HEADER_BYTES = 13;
/** A chunk's length and type before its data, and its checksum after. */
const BEFORE_DATA = 8;
const CHECKSUM_BYTES = 4;

export const isPng = (bytes: Buffer): boolean => bytes.subarray(0, SIGNATURE.length).equals(SIGNATURE);

/** Goes through all chunks of a PNG: the header first, the end last, nothing after it, every checksum right. */
export function examinePng(bytes: Buffer): Finding {
  let hasData = false;
  for (let at = SIGNATURE.length; at < bytes.length; ) {
    const chunk = chunkAt(bytes, at);
    if (!chunk) return damaged("The PNG ends within a chunk, or a chunk's checksum is wrong.");
    const first = at === SIGNATURE.length;
    if (first !== (chunk.type === "IHDR") || (first && !isHeader(chunk.data))) return damaged("The PNG does not begin with one header that states its width and height.");
    hasData ||= chunk.type === "IDAT";
    at = chunk.end;
    if (chunk.type !== "IEND") continue;
    if (!hasData) return damaged("The PNG holds no picture.");
    return at === bytes.length ? null : dataAfterEnd("There is data after the end of the PNG.");
  }
  return damaged("The PNG has no end.");
}

const isHeader = (data: Buffer): boolean => data.length === HEADER_BYTES && data.readUInt32BE(0) > 0 && data.readUInt32BE(4) > 0;

function chunkAt(bytes: Buffer, at: number): { type: string; data: Buffer; end: number } | null {
  if (at + BEFORE_DATA > bytes.length) return null;
  const from = at + BEFORE_DATA;
  const to = from + bytes.readUInt32BE(at);
  if (to + CHECKSUM_BYTES > bytes.length) return null;
  if (crc32(bytes.subarray(at + 4, to)) !== bytes.readUInt32BE(to)) return null;
  return { type: bytes.toString("latin1", at + 4, from), data: bytes.subarray(from, to), end: to + CHECKSUM_BYTES };
}
