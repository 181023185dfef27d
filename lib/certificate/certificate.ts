import type { IssuedDocument } from "@/lib/records/issuedDocument";
import { beside, Flow, stacked, type Block } from "./flow";
import type { CertificateOptions, Context } from "./options";
import { numberPages, RUNNING_HEAD } from "./pagination";
import { airflowResult } from "./sections/airflowResult";
import { budget } from "./sections/budget";
import { passedChecks, placeChecks } from "./sections/checks";
import { placeCautions, placeNotes } from "./sections/closing";
import { figure } from "./sections/figure";
import { head, TITLE_WORDS } from "./sections/head";
import { placeIdentity } from "./sections/identity";
import { airFacts, ductFacts, instrumentFacts } from "./sections/measurement";
import { placeReadings, readingBlock, readingTable } from "./sections/readings";
import { placeStandings } from "./sections/standing";
import { placeWorking } from "./sections/working";
import { Sheet } from "./sheet";
import { factRows, table, type Fact } from "./table";
import { heading } from "./text";

export type { CertificateOptions } from "./options";

const GAP = 6;
const GUTTER = 14;
const FIGURE_WIDTH = 192;
const HIGHEST_FIGURE = 250;
/** Width that the names of the checks need. */
const CHECKS_WIDTH = 124;
/** Beyond this facts stand in rows of the whole width. */
const HIGHEST_FACTS = 260;
/** Beyond this a table of readings has the page's width to itself. */
const HIGHEST_BESIDE = 150;

/** What is left over for a second page, up to so much of it, is brought onto the first by drawing all a little smaller. */
const SMALLER = 0.92;
const LEFT_OVER = 0.12;

/**
 * The certificate of an issued traverse, as a tagged PDF. The same document and options always come to the same bytes.
 * @param document As it was signed.
 * @param options What has become of the record since, and where it can be verified.
 * @returns The file: US Letter for results in `ip`, A4 for `si`.
 */
export async function certificate(document: IssuedDocument, options: CertificateOptions): Promise<Buffer> {
  const usual = compose(document, options, 1);
  if (usual.pages !== 2 || usual.lastPage > LEFT_OVER) return usual.sheet.finish();
  const smaller = compose(document, options, SMALLER);
  return (smaller.pages === 1 ? smaller : usual).sheet.finish();
}

interface Composed {
  sheet: Sheet;
  pages: number;
  /** How much of the last page is taken, 0 to 1. */
  lastPage: number;
}

function compose(document: IssuedDocument, options: CertificateOptions, scale: number): Composed {
  const system = document.measurement.units ?? "ip";
  const about = [document.system, document.location].filter(Boolean).join(", ");
  const sheet = new Sheet({
    scale,
    size: system === "ip" ? "LETTER" : "A4",
    title: `${TITLE_WORDS}${about ? `: ${about}` : ""}, revision ${document.revision}`,
    author: document.organisation.name,
    subject: `Record ${document.id}, ${document.project.name}`,
    created: new Date(document.issuedAt),
  });
  const context: Context = { sheet, document, options, system };
  const flow = new Flow(sheet, RUNNING_HEAD);
  const sections = [
    (): void => flow.place(head(context)),
    (): void => placeStandings(context, flow),
    (): void => placeIdentity(context, flow),
    (): void => flow.place(airflowResult(context)),
    (): void => placeFacts(context, flow),
    (): void => placeMeasurement(context, flow),
    (): void => placeWorking(context, flow),
    (): void => placeNotes(context, flow),
    (): void => placeCautions(context, flow),
  ];
  for (const place of sections) {
    const before = flow.top;
    sheet.within("Sect", place);
    if (flow.top !== before) flow.gap(GAP);
  }
  numberPages(context);
  return { sheet, pages: sheet.doc.bufferedPageRange().count, lastPage: 1 - flow.remaining / flow.page };
}

/** Duct, air and instrument beside each other; where the words are too long for columns, one below the other. */
function placeFacts(context: Context, flow: Flow): void {
  const { sheet } = context;
  const groups = [["Duct", ductFacts(context)], ["Air", airFacts(context)], ["Instrument", instrumentFacts(context)]] as const;
  const width = (sheet.width - 2 * GUTTER) / 3;
  const columns = beside(groups.map(([title, facts], index) => ({ at: index * (width + GUTTER), block: factGroup(sheet, title, facts, width) })));
  if (columns.height <= HIGHEST_FACTS) return flow.place(columns);
  for (const [title, facts] of groups) {
    flow.place(heading(sheet, title, sheet.width));
    sheet.within("Table", () => factRows(sheet, facts, sheet.width).forEach((one) => flow.place(one)), { title });
    flow.gap(GAP);
  }
}

const factGroup = (sheet: Sheet, title: string, facts: readonly Fact[], width: number): Block => stacked([heading(sheet, title, width), table(sheet, factRows(sheet, facts, width), title)]);

/**
 * The drawing, and beside it the readings, if they are few, and how sure they make the figure. The checks that passed fill
 * the room to the right of a narrow table of readings.
 */
function placeMeasurement(context: Context, flow: Flow): void {
  const { sheet, document } = context;
  const width = sheet.width - FIGURE_WIDTH - GUTTER;
  const narrow = width - CHECKS_WIDTH - GUTTER;
  const checked = stacked([heading(sheet, "Checks", CHECKS_WIDTH), passedChecks(sheet, document.result.checks, CHECKS_WIDTH, 1)]);
  const besideChecks = readingTable(context, narrow);
  const roomy = besideChecks.parts.length <= 1;
  const few = roomy
    ? beside([{ at: 0, block: readingBlock(context, besideChecks) }, { at: width - CHECKS_WIDTH, block: checked }])
    : readingBlock(context, readingTable(context, width));
  const together = few.height <= HIGHEST_BESIDE;
  const column = stacked([...(together ? [few] : []), budget(context, width)], GAP);
  flow.place(beside([{ at: 0, block: figure(context, FIGURE_WIDTH, HIGHEST_FIGURE) }, { at: FIGURE_WIDTH + GUTTER, block: column }]));
  if (!together) {
    flow.gap(GAP);
    placeReadings(context, flow, readingTable(context, sheet.width));
  }
  flow.gap(GAP);
  placeChecks(context, flow, together && roomy);
}
