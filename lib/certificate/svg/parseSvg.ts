/** An element of a drawing, with the words directly inside it. */
export interface SvgElement {
  name: string;
  attributes: Readonly<Record<string, string>>;
  children: SvgElement[];
  words: string;
}

const TOKEN = /<(\/?)([a-z]+)((?:\s+[a-zA-Z:-]+="[^"]*")*)\s*(\/?)>|([^<]+)/g;
const ATTRIBUTE = /([a-zA-Z:-]+)="([^"]*)"/g;
const ENTITIES: Readonly<Record<string, string>> = { "&amp;": "&", "&lt;": "<", "&gt;": ">", "&quot;": '"', "&#39;": "'" };

const decoded = (text: string): string => text.replace(/&(?:amp|lt|gt|quot|#39);/g, (entity) => ENTITIES[entity]!);

/** Reads a drawing that the engine made. It is no reader of other SVG: the engine's has no comments, no sections of character data and no entities but five. */
export function parseSvg(svg: string): SvgElement {
  const root: SvgElement = { name: "", attributes: {}, children: [], words: "" };
  const open = [root];
  for (const [, closes, name, attributes, empty, words] of svg.matchAll(TOKEN)) {
    const parent = open.at(-1)!;
    if (words !== undefined) parent.words += decoded(words);
    else if (closes) open.pop();
    else {
      const element: SvgElement = { name: name!, attributes: Object.fromEntries([...attributes!.matchAll(ATTRIBUTE)].map(([, key, value]) => [key, decoded(value!)])), children: [], words: "" };
      parent.children.push(element);
      if (!empty) open.push(element);
    }
  }
  return root.children[0] ?? root;
}
