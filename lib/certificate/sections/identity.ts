import { PAPER } from "../colours";
import type { Block, Flow } from "../flow";
import type { Context } from "../options";
import { moment } from "../quantities";
import { BODY, LABEL, leading } from "../styles";
import { factRows, row, table, type Fact } from "../table";

const COLUMNS = 4;
const PADDING = 5;
/** Beyond this the names are no names, and stand in rows that may break. */
const HIGHEST = 160;

function facts({ document }: Context): Fact[] {
  const { project, system, location, technician, organisation, takenAt, issuedAt } = document;
  return [
    ["Project", [project.name, project.number].filter(Boolean).join(", ")],
    ["Project location", project.location ?? "not given"],
    ["System", system ?? "not given"],
    ["Traverse location", location ?? "not given"],
    ["Technician", technician],
    ["Organisation", organisation.name],
    ["Taken", moment(takenAt)],
    ["Issued", moment(issuedAt)],
  ];
}

/** Which job, where, who and when. */
export function placeIdentity(context: Context, flow: Flow): void {
  const { sheet } = context;
  const all = facts(context);
  const block = grid(context, all);
  if (block.height <= HIGHEST) return flow.place(block);
  const rows = factRows(sheet, all, sheet.width);
  sheet.within("Table", () => rows.forEach((one) => flow.place(one)), { title: "Record" });
}

function grid({ sheet }: Context, all: readonly Fact[]): Block {
  const step = (sheet.width - 2 * PADDING) / COLUMNS;
  const columns = Array.from({ length: COLUMNS }, (_, index) => ({ at: index * step, width: step - 8 }));
  const rows = [all.slice(0, COLUMNS), all.slice(COLUMNS)].flatMap((part, index) => [
    ...(index > 0 ? [{ height: 3, draw: () => {} }] : []),
    row(sheet, columns, part.map(([label]) => ({ words: label, style: LABEL, scope: "Column" as const })), 0),
    row(sheet, columns, part.map(([, value]) => ({ words: value, style: { ...BODY, size: 8.2 } })), 0),
  ]);
  const inner = table(sheet, rows, "Record");
  return {
    height: inner.height + 2 * PADDING,
    draw: (x, y) => {
      sheet.artifact(() => sheet.doc.roundedRect(x, y, sheet.width, inner.height + 2 * PADDING, 2).fill(PAPER));
      inner.draw(x + PADDING, y + PADDING - leading(LABEL) * 0.1);
    },
  };
}
