import { fromSi } from "../units/convert";
import { ANSWER_UNITS, type AirflowUnit, type AreaUnit } from "../units/units";
import type { Case } from "./case";
import type { Slip, SlipName } from "./slip";
import { airflowOn, areaOn, averageOn, type Worksheet } from "./worksheet";

/** A supposed slip with the worksheet it leads to, or two of them, one upon the other. */
export interface Hypothesis {
  slips: Slip[];
  sheet: Worksheet;
}

/** The slips of one family that could have been made on a worksheet. */
export type SlipFamily = (one: Case, sheet: Worksheet) => Hypothesis[];

/** A slip in the way a figure is worked out, told by what the figure is before and after it. */
export function methodSlip(one: Case, sheet: Worksheet, changed: Worksheet, slip: SlipName, figure: "average" | "area" | "airflow", detail: string): Hypothesis {
  const worked = (on: Worksheet): { value: number; unit: string } => {
    if (figure === "average") return fromSi("velocity", averageOn(one, on), one.velocityUnit);
    if (figure === "area") return fromSi("area", areaOn(one, on)!, (one.figures.area?.unit ?? ANSWER_UNITS[one.system].area) as AreaUnit);
    return fromSi("airflow", airflowOn(one, on)!, (one.figures.airflow?.unit ?? ANSWER_UNITS[one.system].airflow) as AirflowUnit);
  };
  const { value: used, unit } = worked(changed);
  return { slips: [{ slip, figure, read: worked(sheet).value, used, unit, detail }], sheet: changed };
}
