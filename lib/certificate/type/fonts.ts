import { readFileSync } from "node:fs";
import path from "node:path";
import { create, type Font } from "fontkit";
import { sfntOf } from "./sfntOf";

export type Face = "text" | "strong" | "figures" | "figuresStrong";

const files = (family: string, weight: number): string[] => ["latin", "latin-ext"].map((subset) => `${family}/files/${family}-${subset}-${weight}-normal.woff`);
const wide = (weight: number): string => `dejavu-sans/files/dejavu-sans-latin-${weight}-normal.woff`;
/** Has a sign for every character of the basic plane, however plain. */
const WIDEST = "unifontex/files/unifontex-latin-400-normal.woff";

/** Fonts of each face in the order in which a character is looked for: the product's own, then ones that know more scripts. */
const STACKS: Readonly<Record<Face, readonly string[]>> = {
  text: [...files("instrument-sans", 400), wide(400), WIDEST],
  strong: [...files("instrument-sans", 600), wide(700), WIDEST],
  figures: [...files("spline-sans-mono", 400), wide(400), WIDEST],
  figuresStrong: [...files("spline-sans-mono", 600), wide(700), WIDEST],
};

/** Fonts at the head of a stack that are parts of the product's own. */
const OWN = 2;

const unpacked = new Map<string, Buffer>();

function bytesOf(file: string): Buffer {
  let bytes = unpacked.get(file);
  if (!bytes) {
    bytes = sfntOf(readFileSync(path.join(process.cwd(), "node_modules/@fontsource", file)));
    unpacked.set(file, bytes);
  }
  return bytes;
}

/**
 * The fonts of one document. Files are read once for the process; what a font remembers of the characters it has met stays
 * with its document, so that the same document always comes to the same bytes.
 */
export class Fonts {
  readonly #open = new Map<string, Font>();

  open(file: string): Font {
    let font = this.#open.get(file);
    if (!font) {
      font = create(bytesOf(file)) as Font;
      this.#open.set(file, font);
    }
    return font;
  }

  /**
   * The first font of a face that has all of the characters; undefined where none has. A letter with a mark above or below is
   * left to the fonts that know where the mark goes.
   */
  fileFor(face: Face, codePoints: readonly number[]): string | undefined {
    const stack = STACKS[face].slice(codePoints.length > 1 ? OWN : 0);
    return stack.find((file) => codePoints.every((codePoint) => this.open(file).hasGlyphForCodePoint(codePoint)));
  }

  /** The font that a face is set in where nothing else is needed. */
  first(face: Face): string {
    return STACKS[face][0]!;
  }
}
