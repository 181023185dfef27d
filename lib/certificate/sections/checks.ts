import type { Check, CheckCode, Severity } from "@/lib/airflow/checks/check";
import { ACTION, OCHRE, RUST } from "../colours";
import { beside, stacked, type Block, type Flow } from "../flow";
import type { Context } from "../options";
import type { Sheet } from "../sheet";
import { ascent, BODY, FINE } from "../styles";
import { flowing, INDENT, paragraph, sideHeading } from "../text";

const NAMES: Record<CheckCode, string> = {
  points_below_minimum: "Number of points",
  uniformity: "Profile evenness",
  negative_reading: "Negative readings",
  low_velocity: "Low velocity",
  site_disturbance: "Straight lengths",
  profile_asymmetry: "Profile symmetry",
  possible_slip: "Possible slips",
  density_assumed: "Density assumed",
  probe_blockage: "Probe blockage",
  compressibility: "Compressibility",
  near_wall: "Points near the wall",
  duct_below_minimum: "Size of the duct",
  probe_length: "Length of the probe",
};
const SEVERITIES: Record<Severity, { word: string; colour: string }> = {
  information: { word: "note", colour: ACTION },
  caution: { word: "caution", colour: OCHRE },
  failure: { word: "failure", colour: RUST },
};
const SIGN = 11;
const COLUMNS = 4;

/** The checks that failed in full, then, unless they stand elsewhere, the names of those that passed. */
export function placeChecks({ sheet, document }: Context, flow: Flow, passedElsewhere: boolean): void {
  const { checks } = document.result;
  const failed = checks.filter(({ passed }) => !passed);
  const blocks = failed.map((check) => failing(sheet, check));
  if (!passedElsewhere) blocks.push(indented(passedChecks(sheet, checks, sheet.width - INDENT, COLUMNS)));
  if (blocks.length === 0) return;
  sideHeading(sheet, flow, "Checks", Math.min(blocks[0]!.height, flow.page));
  blocks.forEach((block, index) => {
    if (block.height <= flow.page) flow.place(block);
    else flowing(sheet, flow, failedWords(failed[index]!), BODY, INDENT);
  });
}

const indented = (block: Block): Block => beside([{ at: INDENT, block }]);

const failedWords = ({ code, severity, detail }: Check): string => `${NAMES[code]}, ${SEVERITIES[severity].word}. ${detail.replace(/in_wg/g, "in. w.g.")}`;

function failing(sheet: Sheet, check: Check): Block {
  const { colour } = SEVERITIES[check.severity];
  const words = stacked([paragraph(sheet, failedWords(check), BODY, sheet.width - INDENT - SIGN), paragraph(sheet, `Limit: ${check.source}`, FINE, sheet.width - INDENT - SIGN)]);
  const sign: Block = {
    height: 9,
    draw: (x, y) =>
      sheet.artifact(() => {
        sheet.doc.polygon([x + 3.5, y + 1], [x + 7, y + 7.5], [x, y + 7.5]).fill(colour);
      }),
  };
  return stacked([beside([{ at: INDENT, block: sign }, { at: INDENT + SIGN, block: words }]), { height: 1.5, draw: () => {} }]);
}

/** The checks that passed, by name, row by row. */
export function passedChecks(sheet: Sheet, checks: readonly Check[], width: number, columns: number): Block {
  const step = width / columns;
  const passed = checks.filter((check) => check.passed).map(({ code }) => ticked(sheet, `${NAMES[code]}: passed`, step - 4));
  const rows = Array.from({ length: Math.ceil(passed.length / columns) }, (_, index) => passed.slice(index * columns, (index + 1) * columns));
  return stacked(rows.map((part) => beside(part.map((block, index) => ({ at: index * step, block })))));
}

function ticked(sheet: Sheet, words: string, width: number): Block {
  const block = paragraph(sheet, words, BODY, width - SIGN);
  return {
    height: block.height,
    draw: (x, y) => {
      const base = y + ascent(BODY);
      sheet.artifact(() => sheet.doc.moveTo(x + 0.5, base - 3).lineTo(x + 2.8, base - 0.8).lineTo(x + 7, base - 6).lineWidth(1.2).strokeColor(ACTION).stroke());
      block.draw(x + SIGN, y);
    },
  };
}
