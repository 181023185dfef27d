import { MARGIN, type Sheet } from "./sheet";

/** Something that stands on one page and knows its height before it is drawn. */
export interface Block {
  height: number;
  draw: (x: number, y: number) => void;
}

/** Takes room on the page from the top down, and goes on to the next one where there is none left. */
export class Flow {
  #y = MARGIN.top;
  readonly #sheet: Sheet;
  readonly #runningHead: number;

  /** @param runningHead Height kept free at the head of each page after the first. */
  constructor(sheet: Sheet, runningHead: number) {
    this.#sheet = sheet;
    this.#runningHead = runningHead;
  }

  /** Where the next block stands, if it fits. */
  get top(): number {
    return this.#y;
  }
  get remaining(): number {
    return this.#sheet.bottom - this.#y;
  }
  /** What a fresh page has room for. */
  get page(): number {
    return this.#sheet.bottom - MARGIN.top - this.#runningHead;
  }

  gap(height: number): void {
    this.#y = Math.min(this.#y + height, this.#sheet.bottom);
  }

  /** Begins a page where less than this is left. True when it did. */
  ensure(height: number): boolean {
    if (height <= this.remaining) return false;
    this.#sheet.doc.addPage();
    this.#y = MARGIN.top + this.#runningHead;
    return true;
  }

  /** Room of a height on one page. Returns its top. */
  take(height: number): number {
    this.ensure(height);
    const top = this.#y;
    this.#y += height;
    return top;
  }

  place({ height, draw }: Block): void {
    draw(this.#sheet.left, this.take(height));
  }
}

/** Blocks one below the other, as one. */
export function stacked(blocks: readonly Block[], gap = 0): Block {
  const height = blocks.reduce((sum, block) => sum + block.height, 0) + gap * Math.max(0, blocks.length - 1);
  return {
    height,
    draw: (x, y) => {
      let top = y;
      for (const block of blocks) {
        block.draw(x, top);
        top += block.height + gap;
      }
    },
  };
}

/** Blocks side by side, as one, read from the left. */
export function beside(parts: readonly { at: number; block: Block }[]): Block {
  return {
    height: Math.max(0, ...parts.map(({ block }) => block.height)),
    draw: (x, y) => parts.forEach(({ at, block }) => block.draw(x + at, y)),
  };
}
