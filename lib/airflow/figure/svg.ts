export type Attributes = Record<string, string | number | undefined>;

const ENTITIES: Record<string, string> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;", "'": "&#39;" };

/** Text as XML may hold it: markup escaped, and characters that XML forbids left out. */
export const escapeText = (text: string): string => text.replace(/[^\t\n\r\u0020-\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu, "").replace(/[&<>"']/g, (character) => ENTITIES[character]!);

/** Coordinates to a hundredth of a drawing unit; finer ones would only make the file longer. */
const written = (value: string | number): string => (typeof value === "number" ? String(Math.round(value * 100) / 100) : escapeText(value));

/** An element. Children are SVG already; attributes that are undefined are left out. */
export function element(name: string, attributes: Attributes, ...children: string[]): string {
  const list = Object.entries(attributes).flatMap(([key, value]) => (value === undefined ? [] : [` ${key}="${written(value)}"`])).join("");
  return children.length === 0 ? `<${name}${list}/>` : `<${name}${list}>${children.join("")}</${name}>`;
}

/** A line of text; the words are escaped. */
export const text = (words: string, attributes: Attributes): string => element("text", attributes, escapeText(words));

/** Straight strokes, each a list of corners. */
export const strokes = (lines: readonly (readonly (readonly [number, number])[])[], attributes: Attributes): string =>
  element("path", { d: lines.map((line) => line.map(([x, y], index) => `${index === 0 ? "M" : "L"}${written(x)} ${written(y)}`).join("")).join(""), fill: "none", ...attributes });

/** A drawing that is a document of its own prints on one page, however long it is; in a page, the page decides. */
const PRINTED_WHOLE = "<style>@media print{@page{margin:12mm}svg:root{width:100%;height:auto;max-height:99vh}}</style>";

/** A whole drawing: named, described in words, its colours those of the page it stands on or else those of paper. */
export function drawing(size: { width: number; height: number }, words: { title: string; description: string }, ...children: string[]): string {
  const { width, height } = size;
  return element(
    "svg",
    { xmlns: "http://www.w3.org/2000/svg", role: "img", viewBox: `0 0 ${written(width)} ${written(height)}`, width, height, "font-family": MONO, "font-size": FONT_SIZE, fill: INK },
    element("title", {}, escapeText(words.title)),
    element("desc", {}, escapeText(words.description)),
    PRINTED_WHOLE,
    ...children,
  );
}

export const INK = "var(--ink, #18211f)";
export const MUTED = "var(--muted, #55615d)";
export const EDGE = "var(--edge, #7a8681)";
export const RULE = "var(--rule, #cbd0cc)";
export const CARD = "var(--card, #ffffff)";
export const INSET = "var(--inset, #ecece6)";
export const ACTION = "var(--action, #1e6b62)";
export const RUST = "var(--rust, #b4431f)";

export const MONO = "'Spline Sans Mono', ui-monospace, 'DejaVu Sans Mono', monospace";
export const SANS = "'Instrument Sans Variable', 'Instrument Sans', system-ui, sans-serif";
export const FONT_SIZE = 11;

/** Width of words in the monospaced face: every character takes three fifths of the size. */
export const monoWidth = (words: string, size = FONT_SIZE): number => words.length * size * 0.6;

/** Words broken into lines that fit a width, for the proportional face, whose characters are on average a little over half as wide as high. */
export function wrap(words: string, width: number, size: number): string[] {
  const most = Math.max(1, Math.floor(width / (size * 0.56)));
  const lines: string[] = [];
  for (const word of words.split(" ")) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + 1 + word.length <= most) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}
