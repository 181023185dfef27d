import { damaged, dataAfterEnd, type Finding } from "./finding";

/** Markers of a JPEG: ITU-T T.81 (1992), table B.1. */
const START = 0xd8;
const END = 0xd9;
const START_OF_SCAN = 0xda;
const [FIRST_FRAME, LAST_FRAME] = [0xc0, 0xcf];
/** Within the frames' range of codes, but no frames: Huffman tables, reserved, arithmetic conditioning. */
const NOT_FRAMES = [0xc4, 0xc8, 0xcc];
const [FIRST_RESTART, LAST_RESTART] = [0xd0, 0xd7];
const LEAST_FRAME_BYTES = 8;

export const isJpeg = (bytes: Buffer): boolean => startsAt(bytes, 0) && bytes[2] === 0xff;

/**
 * Goes through all segments of a JPEG. Further whole JPEGs may follow, with zeros between: telephones store a depth or
 * brightness map of the picture like that (CIPA DC-007, Multi-Picture Format).
 */
export function examineJpeg(bytes: Buffer): Finding {
  let at = pictureEnd(bytes, 0);
  if (at === null) return damaged("The JPEG is cut off, or holds no picture.");
  for (at = afterZeros(bytes, at); at < bytes.length; at = afterZeros(bytes, at)) {
    const end = pictureEnd(bytes, at);
    if (end === null) return dataAfterEnd("There is data after the end of the JPEG that is no further picture. Save the picture without motion or sound.");
    at = end;
  }
  return null;
}

/** Where the JPEG that begins at `from` ends; null where none does, or it is cut off or without a picture. */
function pictureEnd(bytes: Buffer, from: number): number | null {
  if (!startsAt(bytes, from)) return null;
  let [at, hasFrame, hasScan] = [from + 2, false, false];
  for (;;) {
    const marker = markerAt(bytes, at);
    if (!marker) return null;
    if (marker.code === END) return hasScan ? marker.end : null;
    const length = marker.end + 2 <= bytes.length ? bytes.readUInt16BE(marker.end) : 0;
    at = marker.end + length;
    if (!hasSegment(marker.code) || length < 2 || at > bytes.length) return null;
    if (isFrame(marker.code)) {
      if (length < LEAST_FRAME_BYTES) return null;
      hasFrame = true;
    }
    if (marker.code === START_OF_SCAN) {
      if (!hasFrame) return null;
      hasScan = true;
      at = scanEnd(bytes, at);
    }
  }
}

const startsAt = (bytes: Buffer, at: number): boolean => bytes[at] === 0xff && bytes[at + 1] === START;
const isFrame = (code: number): boolean => code >= FIRST_FRAME && code <= LAST_FRAME && !NOT_FRAMES.includes(code);
/** All codes from the frames' first on have a segment, but for restarts, start and end. */
const hasSegment = (code: number): boolean => code >= FIRST_FRAME && code !== 0xff && !(code >= FIRST_RESTART && code <= START);

/** A marker, before which any number of fill bytes may stand. */
function markerAt(bytes: Buffer, at: number): { code: number; end: number } | null {
  if (bytes[at] !== 0xff) return null;
  while (bytes[at] === 0xff) at += 1;
  const code = bytes[at];
  return code === undefined ? null : { code, end: at + 1 };
}

/** Where the compressed data that begins at `at` gives way to a marker, restarts not counted. */
function scanEnd(bytes: Buffer, at: number): number {
  for (let mark = bytes.indexOf(0xff, at); mark >= 0; mark = bytes.indexOf(0xff, mark + 1)) {
    const next = bytes[mark + 1];
    if (next !== undefined && next !== 0x00 && next !== 0xff && !(next >= FIRST_RESTART && next <= LAST_RESTART)) return mark;
  }
  return bytes.length;
}

function afterZeros(bytes: Buffer, at: number): number {
  while (bytes[at] === 0) at += 1;
  return at;
}
