import { OCHRE_WASH, OCHRE, RUST, RUST_WASH, INK } from "../colours";
import type { Flow } from "../flow";
import type { CertificateOptions, Context } from "../options";
import type { Style } from "../sheet";
import { ascent, leading } from "../styles";
import { wrap } from "../type/wrap";
import type { IssuedDocument } from "@/lib/records/issuedDocument";

interface Standing {
  word: string;
  words: string;
  wash: string;
  edge: string;
}

/** What a reader must know before anything else: that the record no longer stands, or never was one of a real job. */
export function standings({ environment }: Pick<IssuedDocument, "environment">, { status, supersededBy, voidReason }: CertificateOptions): Standing[] {
  const rust = { wash: RUST_WASH, edge: RUST };
  return [
    ...(status === "void" ? [{ word: "Void", words: `This record was withdrawn. ${voidReason ? `Reason: ${voidReason}` : "No reason was given."}`, ...rust }] : []),
    ...(status === "superseded" ? [{ word: "Superseded", words: `${supersededBy ? `Record ${supersededBy}` : "A later revision"} replaces this one. Use that one.`, ...rust }] : []),
    ...(environment === "sandbox" ? [{ word: "Sandbox", words: "This record was made for trying out. It certifies nothing.", wash: OCHRE_WASH, edge: OCHRE }] : []),
  ];
}

const WORD: Style = { face: "strong", size: 15, colour: INK };
const WORDS: Style = { face: "text", size: 9, colour: INK };
const PADDING = 5;

/** The standings across the whole head. A long reason goes on over as many lines, and pages, as it needs. */
export function placeStandings({ sheet, document, options }: Context, flow: Flow): void {
  for (const { word, words, wash, edge } of standings(document, options)) {
    const inset = sheet.left + 12;
    const from = inset + sheet.widthOf(word, WORD) + 12;
    const lines = wrap(sheet, words, WORDS, sheet.left + sheet.width - from - 8);
    const surface = (y: number, height: number): void =>
      sheet.artifact(() => {
        sheet.doc.rect(sheet.left, y, sheet.width, height).fill(wash);
        sheet.doc.rect(sheet.left, y, 4, height).fill(edge);
      });
    sheet.within("P", () =>
      lines.forEach((line, index) => {
        const [first, last] = [index === 0, index === lines.length - 1];
        const head = first ? PADDING + 4 : 0;
        const height = head + leading(WORDS) + (last ? PADDING : 0);
        const y = flow.take(height);
        surface(y, height);
        const base = y + head + ascent(WORDS);
        if (first) sheet.content(() => sheet.write(word, inset, base + 1, { ...WORD, colour: edge === RUST ? RUST : INK }));
        sheet.content(() => sheet.write(line, from, base, WORDS));
      }),
    );
  }
}
