import { inflateSync } from "node:zlib";

const HEADER = 44;
const ENTRY = 20;

/**
 * A WOFF font unpacked to the tables it holds. The font reader would otherwise inflate a whole table for each glyph.
 * @see W3C Recommendation "WOFF File Format 1.0", sections 3 to 5.
 */
export function sfntOf(woff: Buffer): Buffer {
  const count = woff.readUInt16BE(12);
  const tables = Array.from({ length: count }, (_, index) => {
    const at = HEADER + index * ENTRY;
    const [offset, packed, length] = [woff.readUInt32BE(at + 4), woff.readUInt32BE(at + 8), woff.readUInt32BE(at + 12)];
    const held = woff.subarray(offset, offset + packed);
    return { tag: woff.subarray(at, at + 4), checksum: woff.subarray(at + 16, at + 20), data: packed < length ? inflateSync(held) : held };
  });
  const directory = Buffer.alloc(12 + 16 * count);
  const power = Math.floor(Math.log2(count));
  woff.copy(directory, 0, 4, 8);
  [count, 16 * 2 ** power, power, 16 * (count - 2 ** power)].forEach((value, index) => directory.writeUInt16BE(value, 4 + 2 * index));
  let offset = directory.length;
  const bodies = tables.map(({ tag, checksum, data }, index) => {
    const at = 12 + 16 * index;
    tag.copy(directory, at);
    checksum.copy(directory, at + 4);
    directory.writeUInt32BE(offset, at + 8);
    directory.writeUInt32BE(data.length, at + 12);
    const padded = Buffer.concat([data, Buffer.alloc(-data.length & 3)]);
    offset += padded.length;
    return padded;
  });
  return Buffer.concat([directory, ...bodies]);
}
