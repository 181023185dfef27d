import type { Sheet, Style } from "../sheet";
import { characters, lineOf } from "./runs";

/** A text broken into lines that fit a width: at line ends of its own, at spaces, and inside a word only where it alone is too wide. */
export function wrap(sheet: Sheet, text: string, style: Style, width: number): string[] {
  return text.split(/\r\n|[\n\r\u2028\u2029]/).flatMap((paragraph) => wrapLine(sheet, lineOf(paragraph), style, width));
}

function wrapLine(sheet: Sheet, paragraph: string, style: Style, width: number): string[] {
  const space = sheet.widthOf(" ", style);
  const lines: string[] = [];
  let line = "";
  let reached = 0;
  for (const word of paragraph.split(/ +/).flatMap((one) => pieces(sheet, one, style, width))) {
    const wide = sheet.widthOf(word, style);
    if (line !== "" && reached + space + wide > width) {
      lines.push(line);
      line = "";
    }
    reached = line === "" ? wide : reached + space + wide;
    line = line === "" ? word : `${line} ${word}`;
  }
  return [...lines, line];
}

/** A word whole where it fits a line, else cut between characters. */
function pieces(sheet: Sheet, word: string, style: Style, width: number): string[] {
  if (sheet.widthOf(word, style) <= width) return [word];
  const cut: string[] = [];
  let piece = "";
  let reached = 0;
  for (const character of characters(word)) {
    const wide = sheet.widthOf(character, style);
    if (piece !== "" && reached + wide > width) {
      cut.push(piece);
      piece = "";
      reached = 0;
    }
    piece += character;
    reached += wide;
  }
  return [...cut, piece];
}
