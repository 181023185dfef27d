import PDFDocument from "pdfkit";
import { INK } from "./colours";
import { Fonts, type Face } from "./type/fonts";
import { lineOf, runsOf, type Run } from "./type/runs";

export interface Style {
  face: Face;
  size: number;
  colour?: string;
}

export interface SheetSettings {
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
  bbox?: [number, number, number, number];
}

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
  #element: PDFKit.PDFStructureElement;

  constructor({ size, title, author, subject, created }: SheetSettings) {
    const info = { Title: title, Author: author, Subject: subject, Creator: "Averduct", Producer: "Averduct", CreationDate: created, ModDate: created };
    // The first font is opened when something is written: pdfkit would otherwise open one that the page does not use.
    const options = { size, margin: 0, info, pdfVersion: "1.7", tagged: true, lang: "en", displayTitle: true, bufferPages: true, font: null } as unknown as PDFKit.PDFDocumentOptions;
    this.doc = new PDFDocument(options);
    this.#element = this.doc.struct("Document");
    this.doc.addStructure(this.#element);
  }

  get left(): number {
    return MARGIN.side;
  }
  get width(): number {
    return this.doc.page.width - 2 * MARGIN.side;
  }
  get bottom(): number {
    return this.doc.page.height - MARGIN.bottom;
  }

  /** An element of the structure round whatever is written meanwhile. */
  within(type: string, body: () => void, options: TagOptions = {}): void {
    const outer = this.#element;
    const element = this.doc.struct(type, options as PDFKit.Mixins.StructureElementOptions);
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

  widthOf(words: string, { face, size }: Style): number {
    return this.#runsOf(words, face).reduce((sum, run) => sum + this.#font(run.file).fontSize(size).widthOfString(run.words), 0);
  }

  /** One line of words on a base line. `x` is its left, its middle or its right. */
  write(words: string, x: number, y: number, { face, size, colour = INK }: Style, align: "left" | "middle" | "right" = "left"): void {
    const runs = this.#runsOf(words, face);
    let at = x;
    if (align !== "left") at -= this.widthOf(words, { face, size }) * (align === "right" ? 1 : 0.5);
    for (const run of runs) {
      this.#font(run.file).fontSize(size);
      const wide = this.doc.widthOfString(run.words);
      this.doc.fillColor(colour).text(run.words, at, y, { lineBreak: false, baseline: "alphabetic" });
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
