import { element, INK, MUTED, SANS, text, wrap } from "./svg";

/** Drawing that stands below others and knows how high it is. */
export interface Block {
  svg: string;
  height: number;
}

/** Blocks one below the other. */
export function stack(blocks: readonly Block[], gap: number): Block {
  let height = 0;
  const parts = blocks.map((block) => {
    const part = element("g", { transform: `translate(0 ${Math.round(height)})` }, block.svg);
    height += block.height + gap;
    return part;
  });
  return { svg: parts.join(""), height: Math.max(0, height - gap) };
}

/** What a drawing is called, and what it shows. */
export function heading(title: string, subtitle: string, width: number): Block {
  const lines = [...wrap(title, width, 15).map((words) => ({ words, size: 15, weight: 600, fill: INK })), ...wrap(subtitle, width, 12).map((words) => ({ words, size: 12, weight: 400, fill: MUTED }))];
  let y = 0;
  const svg = lines.map(({ words, size, weight, fill }) => {
    y += size + 4;
    return text(words, { y, "font-family": SANS, "font-size": size, "font-weight": weight, fill });
  });
  return { svg: svg.join(""), height: y + 4 };
}

/** A paragraph. */
export function note(words: string, width: number, size = 11.5): Block {
  const lines = wrap(words, width, size);
  return { svg: lines.map((line, index) => text(line, { y: 12 + index * 15, "font-family": SANS, "font-size": size, fill: MUTED })).join(""), height: lines.length * 15 };
}
