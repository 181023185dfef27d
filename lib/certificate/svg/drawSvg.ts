import type { Sheet } from "../sheet";
import type { Face } from "../type/fonts";
import type { SvgElement } from "./parseSvg";

/** Presentation attributes that children have from their parents, as far as the engine's drawings use them. */
interface Inherited {
  size: number;
  family: string;
  fill: string;
}

/** Draws a drawing of the engine with its upper left corner at the sheet's origin, in its own units. */
export function drawSvg(sheet: Sheet, svg: SvgElement): void {
  drawChildren(sheet, svg, { size: 11, family: "", fill: "#000000" });
}

function drawChildren(sheet: Sheet, element: SvgElement, outer: Inherited): void {
  const { attributes, children } = element;
  const own = { size: Number(attributes["font-size"] ?? outer.size), family: attributes["font-family"] ?? outer.family, fill: attributes.fill ?? outer.fill };
  for (const child of children) drawElement(sheet, child, own);
}

function drawElement(sheet: Sheet, element: SvgElement, outer: Inherited): void {
  const { attributes, name } = element;
  if (name === "title" || name === "desc" || name === "style") return;
  const { doc } = sheet;
  doc.save();
  applyTransform(doc, attributes.transform);
  if (name === "g") drawChildren(sheet, element, outer);
  else if (name === "text") drawText(sheet, element, outer);
  else drawShape(doc, element, outer);
  doc.restore();
}

function applyTransform(doc: PDFKit.PDFDocument, transform: string | undefined): void {
  const [, kind, list] = /^(translate|rotate)\(([^)]*)\)$/.exec(transform ?? "") ?? [];
  const [a = 0, b = 0, c = 0] = (list ?? "").split(/[\s,]+/).map(Number);
  if (kind === "translate") doc.translate(a, b);
  if (kind === "rotate") doc.rotate(a, { origin: [b, c] });
}

/** A colour of the page's theme is on paper the one that it falls back to. */
const paint = (value: string): string => /^var\([^,]+,\s*([^)]+)\)$/.exec(value)?.[1] ?? value;

const numberOf = ({ attributes }: SvgElement, key: string): number => Number(attributes[key] ?? 0);

function drawShape(doc: PDFKit.PDFDocument, element: SvgElement, outer: Inherited): void {
  const { name, attributes } = element;
  const at = (key: string): number => numberOf(element, key);
  if (name === "rect") doc.rect(at("x"), at("y"), at("width"), at("height"));
  else if (name === "circle") doc.circle(at("cx"), at("cy"), at("r"));
  else if (name === "path") doc.path(attributes.d ?? "");
  else throw new Error(`A certificate's figure cannot draw <${name}>.`);
  const fill = paint(attributes.fill ?? outer.fill);
  const stroke = paint(attributes.stroke ?? "none");
  if (stroke !== "none") {
    doc.lineWidth(Number(attributes["stroke-width"] ?? 1));
    if (attributes["stroke-linecap"]) doc.lineCap(attributes["stroke-linecap"]);
    const [dash, space] = (attributes["stroke-dasharray"] ?? "").split(" ").map(Number);
    if (dash) doc.dash(dash, { space });
  }
  if (fill !== "none" && stroke !== "none") doc.fillAndStroke(fill, stroke);
  else if (fill !== "none") doc.fill(fill);
  else if (stroke !== "none") doc.stroke(stroke);
  else doc.clip();
}

const ALIGN = { start: "left", middle: "middle", end: "right" } as const;
const OFFSET = { left: 0, middle: 0.5, right: 1 };

/** Height of capitals and figures against the size of the face. */
const CAP = 0.72;

/** Words. Where the drawing has a halo that keeps them legible over lines, a surface does: outlined letters would be read twice. */
function drawText(sheet: Sheet, element: SvgElement, outer: Inherited): void {
  const { attributes, words } = element;
  const size = Number(attributes["font-size"] ?? outer.size);
  const sans = (attributes["font-family"] ?? outer.family).includes("Sans Variable");
  const bold = attributes["font-weight"] === "600";
  const face: Face = sans ? (bold ? "strong" : "text") : bold ? "figuresStrong" : "figures";
  const y = numberOf(element, "y") + parseFloat(attributes.dy ?? "0") * size;
  const align = ALIGN[(attributes["text-anchor"] ?? "start") as keyof typeof ALIGN];
  const style = { face, size, colour: paint(attributes.fill ?? outer.fill) };
  const x = numberOf(element, "x");
  if (attributes.stroke) {
    const wide = sheet.widthOf(words, style);
    sheet.doc.rect(x - wide * OFFSET[align] - 1, y - CAP * size - 1, wide + 2, CAP * size + 2).fill(paint(attributes.stroke));
  }
  sheet.write(words, x, y, style, align);
}
