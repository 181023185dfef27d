import PDFDocument from "pdfkit";
import { INK } from "./colours";
import { Fonts, type Face } from "./type/fonts";
import { lineOf, runsOf, type Run } from "./type/runs";

export interface Style {
  face: Face;
  size: number;
  colour?: string;
  /** The words are a formula: what follows `_` stands lower, what follows `^` higher. */
  formula?: boolean;
}

export interface SheetSettings {
  /** Everything is drawn this much smaller than its size says, and the page holds so much more. */
  scale: number;
  size: "LETTER" | "A4";
  title: string;
  author: string;
  subject: string;
  created: Date;
}

/** Attributes of a structure element; `scope` says which cells a table's header is for. */
export interface TagOptions {
  alt?: string;
  title?: string;
  scope?: "Row" | "Column";
  /** Left, top, right and bottom of a figure. */
  bbox?: [number, number, number, number];
}

/** A run with its size, and how far below the base line it stands. */
interface Piece extends Run {
  size: number;
  drop: number;
}

/** An index or an exponent in a formula as the engine writes it: `p_v`, `x^n`. */
const INDEX = /([_^])([A-Za-z0-9*]+)/;

export const MARGIN = { side: 36, top: 25, bottom: 29 };

/**
 * Paper with a structure: everything written belongs to an element that assistive technology reads (ISO 32000-1, 14.7), or
 * is an artifact. Positions are in points from the left and the top; words stand on the line they are given.
 */
export class Sheet {
  readonly doc: PDFKit.PDFDocument;
  readonly #fonts = new Fonts();
  readonly #registered = new Set<string>();
  readonly #runs = new Map<string, readonly Run[]>();
  readonly #scale: number;
  #element: PDFKit.PDFStructureElement;

  constructor({ scale, size, title, author, subject, created }: SheetSettings) {
    const info = { Title: title, Author: author, Subject: subject, Creator: "Averduct", Producer: "Averduct", CreationDate: created, ModDate: created };
    // The first font is opened when something is written: pdfkit would otherwise open one that the page does not use.
    const options = { size, margin: 0, info, pdfVersion: "1.7", tagged: true, lang: "en", displayTitle: true, bufferPages: true, autoFirstPage: false, font: null } as unknown as PDFKit.PDFDocumentOptions;
    this.#scale = scale;
    this.doc = new PDFDocument(options);
    this.doc.on("pageAdded", () => this.doc.scale(scale));
    this.doc.addPage();
    this.#element = this.doc.struct("Document");
    this.doc.addStructure(this.#element);
  }

  get left(): number {
    return MARGIN.side;
  }
  get width(): number {
    return this.doc.page.width / this.#scale - 2 * MARGIN.side;
  }
  get bottom(): number {
    return this.doc.page.height / this.#scale - MARGIN.bottom;
  }

  /** An element of the structure round whatever is written meanwhile. */
  within(type: string, body: () => void, options: TagOptions = {}): void {
    const outer = this.#element;
    const placed = { ...options, ...(options.bbox && { bbox: options.bbox.map((edge) => edge * this.#scale) }) };
    const element = this.doc.struct(type, placed as PDFKit.Mixins.StructureElementOptions);
    outer.add(element);
    this.#element = element;
    body();
    this.#element = outer;
    element.end();
  }

  /** Something written on one page that belongs to the element it stands in. */
  content(body: () => void): void {
    this.#element.add(body);
  }

  /** An element that holds something written on one page. */
  tagged(type: string, body: () => void, options?: TagOptions): void {
    this.within(type, () => this.content(body), options);
  }

  /** Lines and surfaces that carry no meaning of their own, or what each page repeats. */
  artifact(body: () => void, type: "Layout" | "Pagination" = "Layout"): void {
    this.doc.markContent("Artifact", { type });
    body();
    this.doc.endMarkedContent();
  }

  /** Makes a surface a link, in the `Link` element that it stands in. */
  link(x: number, y: number, width: number, height: number, address: string, words: string): void {
    const options = { structParent: this.#element, Contents: new String(words) } as unknown as PDFKit.Mixins.AnnotationOption;
    this.doc.link(x, y, width, height, address, options);
  }

  widthOf(words: string, style: Style): number {
    return this.#piecesOf(words, style).reduce((sum, { file, words: piece, size }) => sum + this.#font(file).fontSize(size).widthOfString(piece), 0);
  }

  /** One line of words on a base line. `x` is its left, its middle or its right. */
  write(words: string, x: number, y: number, style: Style, align: "left" | "middle" | "right" = "left"): void {
    let at = x;
    if (align !== "left") at -= this.widthOf(words, style) * (align === "right" ? 1 : 0.5);
    this.doc.fillColor(style.colour ?? INK);
    for (const { file, words: piece, size, drop } of this.#piecesOf(words, style)) {
      this.#font(file).fontSize(size);
      const wide = this.doc.widthOfString(piece);
      this.doc.text(piece, at, y + drop, { lineBreak: false, baseline: "alphabetic" });
      at += wide;
    }
  }

  /** The file's bytes. */
  async finish(): Promise<Buffer> {
    const chunks: Buffer[] = [];
    const done = new Promise<void>((resolve, reject) => this.doc.on("end", resolve).on("error", reject));
    this.doc.on("data", (chunk: Buffer) => chunks.push(chunk));
    this.doc.end();
    await done;
    return Buffer.concat(chunks);
  }

  #piecesOf(words: string, { face, size, formula }: Style): Piece[] {
    const plain = { size, drop: 0 };
    if (!formula) return this.#runsOf(words, face).map((run) => ({ ...run, ...plain }));
    return words.split(INDEX).flatMap((part, index, parts) => {
      // Parts alternate: plain words, the sign, what it moves.
      if (index % 3 === 1) return [];
      const moved = index % 3 === 2 ? { size: size * 0.74, drop: size * (parts[index - 1] === "_" ? 0.18 : -0.34) } : plain;
      return this.#runsOf(part, face).map((run) => ({ ...run, ...moved }));
    });
  }

  #runsOf(words: string, face: Face): readonly Run[] {
    const key = `${face} ${words}`;
    let runs = this.#runs.get(key);
    if (!runs) {
      runs = runsOf(lineOf(words), face, this.#fonts);
      this.#runs.set(key, runs);
    }
    return runs;
  }

  #font(file: string): PDFKit.PDFDocument {
    if (!this.#registered.has(file)) {
      this.doc.registerFont(file, this.#fonts.open(file) as unknown as PDFKit.Mixins.PDFFontSource);
      this.#registered.add(file);
    }
    return this.doc.font(file);
  }
}
