/** A piece of text in an SVG, as a box in the drawing's coordinates. */
export interface TextBox {
  words: string;
  left: number;
  right: number;
  top: number;
  bottom: number;
}

interface Element {
  name: string;
  attributes: Record<string, string>;
  /** Sum of the translations of the groups it stands in. */
  dx: number;
  dy: number;
  words: string;
}

const TOKEN = /<(\/)?([a-z]+)((?:\s+[\w:-]+="[^"<]*")*)\s*(\/)?>|([^<]+)/gi;
const ENTITIES: Record<string, string> = { "&amp;": "&", "&lt;": "<", "&gt;": ">", "&quot;": '"', "&#39;": "'" };

/** Every element of an SVG. Throws where it is not well-formed: a stray character, an unknown entity, tags that do not match. */
export function elementsOf(svg: string): Element[] {
  const found: Element[] = [];
  const open: Element[] = [];
  let at = 0;
  for (const [whole, closing, name, list, selfClosing, characters] of svg.matchAll(TOKEN)) {
    if (svg.slice(at, at + whole.length) !== whole) throw new Error(`Not markup: ${svg.slice(at, at + 60)}`);
    at += whole.length;
    if (characters !== undefined) {
      const parent = open.at(-1);
      if (!parent) throw new Error("Text outside the drawing");
      parent.words += decoded(characters);
    } else if (closing) {
      const last = open.pop();
      if (last?.name !== name) throw new Error(`</${name}> closes <${last?.name}>`);
    } else {
      const attributes = Object.fromEntries([...list!.matchAll(/([\w:-]+)="([^"]*)"/g)].map(([, key, value]) => [key!, decoded(value!)]));
      const [, x = "0", y = "0"] = /translate\(([-\d.]+) ([-\d.]+)\)/.exec(attributes.transform ?? "") ?? [];
      const parent = open.at(-1);
      const element = { name: name!, attributes, dx: (parent?.dx ?? 0) + Number(x), dy: (parent?.dy ?? 0) + Number(y), words: "" };
      found.push(element);
      if (!selfClosing) open.push(element);
    }
  }
  if (at !== svg.length || open.length > 0) throw new Error("The drawing is cut off");
  return found;
}

const decoded = (text: string): string =>
  text.replace(/&[^;]*;?/g, (entity) => {
    const character = ENTITIES[entity];
    if (character === undefined) throw new Error(`Unknown entity ${entity}`);
    return character;
  });

/** Where each piece of text stands, its width taken as that of the face it is set in. */
export function textBoxes(svg: string): TextBox[] {
  return elementsOf(svg).filter(({ name }) => name === "text").map(boxOf);
}

function boxOf({ attributes, dx, dy, words }: Element): TextBox {
  const size = Number(attributes["font-size"] ?? 11);
  const width = words.length * size * (attributes["font-family"]?.includes("Sans") && !attributes["font-family"].includes("Mono") ? 0.52 : 0.6);
  const shift = Number(/^([-\d.]+)em$/.exec(attributes.dy ?? "")?.[1] ?? 0) * size;
  const [x, y] = [Number(attributes.x ?? 0), Number(attributes.y ?? 0)];
  const start = { start: 0, middle: -width / 2, end: -width }[attributes["text-anchor"] ?? "start"]!;
  const box = { left: x + start, right: x + start + width, top: y + shift - 0.72 * size, bottom: y + shift };
  const turned = /rotate\(-90 ([-\d.]+) ([-\d.]+)\)/.exec(attributes.transform ?? "");
  const placed = turned ? turnedAbout(box, Number(turned[1]), Number(turned[2])) : box;
  return { words, left: placed.left + dx, right: placed.right + dx, top: placed.top + dy, bottom: placed.bottom + dy };
}

/** A box turned a quarter anticlockwise about a spot. */
const turnedAbout = ({ left, right, top, bottom }: Omit<TextBox, "words">, x: number, y: number): Omit<TextBox, "words"> => ({
  left: x + (top - y),
  right: x + (bottom - y),
  top: y - (right - x),
  bottom: y - (left - x),
});

/** Pairs of texts that touch. */
export function touching(boxes: readonly TextBox[]): string[] {
  return boxes.flatMap((one, index) =>
    boxes.slice(index + 1).flatMap((other) => (one.left < other.right && other.left < one.right && one.top < other.bottom && other.top < one.bottom ? [`"${one.words}" and "${other.words}"`] : [])),
  );
}
