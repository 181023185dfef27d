import bidiFactory from "bidi-js";
import type { Face, Fonts } from "./fonts";

/** A piece of a line in one font, in the order in which it stands on paper. */
export interface Run {
  file: string;
  words: string;
}

interface LevelledRun extends Run {
  /** Embedding level: odd ones run from right to left. */
  level: number;
}

const bidi = bidiFactory();
const graphemes = new Intl.Segmenter("en", { granularity: "grapheme" });
const RIGHT_TO_LEFT = /[\p{Script=Hebrew}\p{Script=Arabic}\p{Script=Syriac}\p{Script=Thaana}\p{Script=Nko}]/u;
const PLAIN = /^[\x20-\x7e]*$/;
/** Joiners and variation selectors have no sign of their own. */
const WITHOUT_SIGN = /[\u200b-\u200f\u202a-\u202e\u2060-\u2069\ufe00-\ufe0f\ufeff]/gu;

/** Text as a line can hold it: no control characters, and no half of a pair. */
export const lineOf = (text: string): string => text.replace(/[\p{Cc}\p{Zl}\p{Zp}]+/gu, " ").replace(/\p{Cs}/gu, "\ufffd").normalize("NFC");

/** What a reader takes for one character, each. */
export const characters = (text: string): string[] => [...graphemes.segment(text)].map(({ segment }) => segment);

/** A line split into runs, each character in the first font of the face that has it; right-to-left scripts in their order. */
export function runsOf(line: string, face: Face, fonts: Fonts): Run[] {
  if (PLAIN.test(line)) return line === "" ? [] : [{ file: fonts.first(face), words: line }];
  const levels = RIGHT_TO_LEFT.test(line) ? bidi.getEmbeddingLevels(line, "ltr").levels : null;
  const runs: LevelledRun[] = [];
  for (const { segment, index } of graphemes.segment(line)) {
    const level = levels?.[index] ?? 0;
    const last = runs.at(-1);
    const piece = inFont(segment, face, fonts);
    if (last && last.file === piece.file && last.level === level) last.words += piece.words;
    else runs.push({ ...piece, level });
  }
  return levels ? visualOrder(runs) : runs;
}

/** A character that no font has is written by its number. */
function inFont(segment: string, face: Face, fonts: Fonts): Run {
  const words = segment.replace(WITHOUT_SIGN, "") || " ";
  const codePoints = [...words].map((character) => character.codePointAt(0)!);
  const file = fonts.fileFor(face, codePoints);
  if (file) return { file, words };
  return { file: fonts.first(face), words: `[${codePoints.map((codePoint) => `U+${codePoint.toString(16).toUpperCase().padStart(4, "0")}`).join(" ")}]` };
}

/** Rule L2 of the Unicode Bidirectional Algorithm (UAX #9), on runs. The font turns letters of a right-to-left run itself. */
function visualOrder(runs: LevelledRun[]): Run[] {
  const ordered = runs.map((run) => (run.level % 2 === 1 && !RIGHT_TO_LEFT.test(run.words) ? { ...run, words: characters(run.words).reverse().join("") } : run));
  const highest = Math.max(0, ...ordered.map(({ level }) => level));
  for (let level = highest; level > 0; level -= 1) {
    for (let from = 0; from < ordered.length; from += 1) {
      let to = from;
      while (to < ordered.length && ordered[to]!.level >= level) to += 1;
      if (to > from) ordered.splice(from, to - from, ...ordered.slice(from, to).reverse());
      from = Math.max(from, to);
    }
  }
  return ordered;
}
