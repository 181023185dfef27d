import { ACTION, INK, MUTED, OCHRE, RUST } from "../colours";
import type { Quantity } from "@/lib/airflow/units/units";
import { beside, stacked, type Block } from "../flow";
import type { Context } from "../options";
import { airflowDecimals, digits, fixed, quantity, unitSymbol } from "../quantities";
import type { Style } from "../sheet";
import { BODY, FINE, HEADING, LABEL } from "../styles";
import { paragraph } from "../text";
import { verdictBand } from "./verdictBand";

const LARGE: Style = { face: "strong", size: 24, colour: INK };
const MIDDLE: Style = { face: "strong", size: 12, colour: INK };

/** The airflow large, with how sure it is, beside it the other two ways to say it, and whether it meets the design. */
export function airflowResult(context: Context): Block {
  const { sheet, document } = context;
  const { airflow: { actual, standard, mass }, uncertainty, air } = document.result;
  const [second, third] = [sheet.width * 0.43, sheet.width * 0.62];
  const decimals = airflowDecimals(actual.value);
  return beside([
    {
      at: 0,
      block: stacked([
        paragraph(sheet, "Airflow, actual", HEADING, second - 10, "H2"),
        paragraph(sheet, written(actual), LARGE, second - 10),
        paragraph(sheet, `± ${fixed(uncertainty.expanded.value, decimals)} ${unitSymbol(uncertainty.expanded.unit)} (${digits(uncertainty.expandedPercent, 2)} %), expanded uncertainty, k = ${uncertainty.coverageFactor}, about 95 %`, BODY, second - 10),
      ]),
    },
    {
      at: second,
      block: stacked([
        paragraph(sheet, `Standard, at ${quantity(air.standardAir.density)}`, LABEL, third - second - 10),
        paragraph(sheet, written(standard), MIDDLE, third - second - 10),
        { height: 3, draw: () => {} },
        paragraph(sheet, "Mass", LABEL, third - second - 10),
        paragraph(sheet, written(mass), MIDDLE, third - second - 10),
      ]),
    },
    { at: third, block: againstDesign(context, sheet.width - third) },
  ]);
}

const written = ({ value, unit }: Quantity): string => `${fixed(value, airflowDecimals(value))} ${unitSymbol(unit)}`;

const VERDICTS = {
  within: { words: "Within tolerance", meaning: "", colour: ACTION },
  outside: { words: "Outside tolerance", meaning: "", colour: RUST },
  undecided: { words: "Undecided", meaning: " The uncertainty crosses the tolerance: this measurement cannot tell.", colour: OCHRE },
} as const;

function againstDesign({ sheet, document }: Context, width: number): Block {
  const { design, airflow } = document.result;
  const title = paragraph(sheet, "Against design", HEADING, width, "H2");
  if (!design) return stacked([title, paragraph(sheet, "No design airflow was given, so there is no verdict.", BODY, width)]);
  const { words, meaning, colour } = VERDICTS[design.verdict];
  const measured = airflow[design.basis];
  return stacked([
    title,
    paragraph(sheet, `${words}, ${fixed(design.percent, 1)} % of design`, { ...MIDDLE, colour: design.verdict === "undecided" ? INK : colour }, width),
    paragraph(sheet, `${design.basis === "actual" ? "Actual" : "Standard"} airflow against ${quantity(design.airflow)} ± ${digits(design.tolerancePercent, 3)} %.${meaning}`, { ...FINE, colour: MUTED }, width),
    verdictBand(sheet, { measured: measured.value, design, colour }, width),
  ]);
}
