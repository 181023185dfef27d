import { proportionalBalance, totalOf, type TerminalFlow } from "../balance/proportionalBalance";
import { AirflowInputError, type InputFault, type Path } from "../errors";
import type { AnswerOptions } from "../types";
import { inAnswerUnits, toSi } from "../units/convert";
import type { QuantityOf } from "../units/units";
import type { WorkingStep } from "../working/working";
import { ratio } from "./airAnswer";
import { resolveOptions, workingPart, type ResolvedOptions } from "./options";

export interface TerminalInput {
  name: string;
  design: QuantityOf<"airflow">;
  measured: QuantityOf<"airflow">;
}
export interface SystemBalanceInput extends AnswerOptions {
  terminals: TerminalInput[];
  /** The traverse of the main duct that serves them. */
  main?: { measured: QuantityOf<"airflow">; design?: QuantityOf<"airflow"> };
  /** Either way from design; 10 % when left out (common practice). */
  tolerance?: QuantityOf<"ratio">;
}

export type BalanceVerdict = "within" | "below" | "above";

export interface FlowAnswer {
  design: QuantityOf<"airflow">;
  measured: QuantityOf<"airflow">;
  difference: QuantityOf<"airflow">;
  percentOfDesign: number;
  verdict: BalanceVerdict;
}
export interface TerminalAnswer extends FlowAnswer {
  name: string;
  /** Measured over design. */
  ratio: number;
  /** Its ratio over that of the key terminal. */
  overLowest: number;
  /** Place in the order of adjusting, 1 at the key terminal. */
  order: number;
  isKey: boolean;
  /** Its share of what all carry now, in proportion to design. */
  proportionate: QuantityOf<"airflow">;
}
export interface LeakageAnswer {
  /** Main less terminals. */
  airflow: QuantityOf<"airflow">;
  percentOfMain: number;
  detail: string;
}
export interface SystemBalanceAnswer {
  terminals: TerminalAnswer[];
  totals: FlowAnswer & { within: number; count: number };
  /** The main against its design, or against that of the terminals; null where it was not measured. */
  main: FlowAnswer | null;
  leakage: LeakageAnswer | null;
  tolerancePercent: number;
  working?: WorkingStep[];
}

const DEFAULT_TOLERANCE = 0.1;
const GREATEST_AIRFLOW = 10_000;

/**
 * Terminals of a system against design and against each other, their sum against the main traverse.
 * @throws {AirflowInputError} A design airflow that is not above 0, a measured one below 0, or nothing measured at the main.
 */
export function systemBalance(input: SystemBalanceInput): SystemBalanceAnswer {
  const options = resolveOptions(input);
  refuseImpossible(input);
  const tolerance = input.tolerance ? toSi("ratio", input.tolerance) : DEFAULT_TOLERANCE;
  const flows = input.terminals.map(({ design, measured }): TerminalFlow => ({ design: toSi("airflow", design), measured: toSi("airflow", measured) }));
  const totals: TerminalFlow = { design: totalOf(flows, "design"), measured: totalOf(flows, "measured") };
  const main = input.main ? { measured: toSi("airflow", input.main.measured), design: input.main.design ? toSi("airflow", input.main.design) : totals.design } : null;
  const terminals = proportionalBalance(flows).map((standing, index): TerminalAnswer => ({
    name: input.terminals[index]!.name,
    ...flowAnswer(flows[index]!, tolerance, options),
    ...standing,
    isKey: standing.order === 1,
    proportionate: inAnswerUnits("airflow", standing.proportionate, options.system),
  }));
  addBalanceWorking(terminals, totals, main, options);
  return {
    terminals,
    totals: { ...flowAnswer(totals, tolerance, options), within: terminals.filter(({ verdict }) => verdict === "within").length, count: terminals.length },
    main: main && flowAnswer(main, tolerance, options),
    leakage: main && leakageAnswer(main.measured, totals.measured, options),
    tolerancePercent: 100 * tolerance,
    ...workingPart(options.working),
  };
}

function flowAnswer({ design, measured }: TerminalFlow, tolerance: number, { system }: ResolvedOptions): FlowAnswer {
  const off = measured / design - 1;
  // A hair for floating point: 90 of 100 at 10 % is within.
  const within = Math.abs(off) <= tolerance + 1e-12;
  return {
    design: inAnswerUnits("airflow", design, system),
    measured: inAnswerUnits("airflow", measured, system),
    difference: inAnswerUnits("airflow", measured - design, system),
    percentOfDesign: (100 * measured) / design,
    verdict: within ? "within" : off < 0 ? "below" : "above",
  };
}

function leakageAnswer(main: number, terminals: number, { system }: ResolvedOptions): LeakageAnswer {
  const detail =
    terminals <= main
      ? "What the main carries and the terminals do not is apparent leakage: leakage of the duct between them, and the errors of all the measurements."
      : "The terminals together carry more than the main, which leakage cannot do: suspect a terminal's flow factor, a terminal of another system, or the traverse.";
  return { airflow: inAnswerUnits("airflow", main - terminals, system), percentOfMain: (100 * (main - terminals)) / main, detail };
}

function refuseImpossible({ terminals, main, tolerance }: SystemBalanceInput): void {
  const faults = [
    ...terminals.flatMap(({ design, measured }, index) => [notAbove0(["terminals", index, "design"], design), below0(["terminals", index, "measured"], measured)]),
    main ? notAbove0(["main", "measured"], main.measured) : null,
    main?.design ? notAbove0(["main", "design"], main.design) : null,
    tolerance && !(tolerance.value >= 0 && tolerance.value <= 100) ? { path: ["tolerance"], code: "tolerance_out_of_range", detail: "A tolerance of 0 to 100 percent is taken." } : null,
  ].filter((fault): fault is InputFault => fault !== null);
  const [first, ...rest] = faults;
  if (first) throw new AirflowInputError(first, ...rest);
  if (terminals.length === 0) throw new AirflowInputError({ path: ["terminals"], code: "no_terminals", detail: "There is no terminal to balance." });
}

const notAbove0 = (path: Path, airflow: QuantityOf<"airflow">): InputFault | null => (airflow.value === 0 ? fault(path, airflow) : below0(path, airflow));

function below0(path: Path, airflow: QuantityOf<"airflow">): InputFault | null {
  const si = toSi("airflow", airflow);
  return si >= 0 && si <= GREATEST_AIRFLOW ? null : fault(path, airflow);
}

const fault = (path: Path, { value, unit }: QuantityOf<"airflow">): InputFault => ({
  path, code: "airflow_out_of_range", detail: `${value} ${unit} is not an airflow that can be balanced. Give airflows as positive numbers, for exhaust too, and check the unit.`,
});

function addBalanceWorking(terminals: readonly TerminalAnswer[], totals: TerminalFlow, main: TerminalFlow | null, { working, system }: ResolvedOptions): void {
  if (!working) return;
  const flow = (si: number): QuantityOf<"airflow"> => inAnswerUnits("airflow", si, system);
  for (const { name, design, measured, ratio: found } of terminals) {
    working.add({ step: `Ratio of ${name}`, equation: "r = Q / Q_d", inputs: { Q: measured, Q_d: design }, value: ratio(found), source: "Definition" });
  }
  working.add({ step: "Ratio of all terminals", equation: "R = Σ Q / Σ Q_d", inputs: { "Σ Q": flow(totals.measured), "Σ Q_d": flow(totals.design) }, value: ratio(totals.measured / totals.design), source: "Definition" });
  if (main) {
    working.add({ step: "Apparent leakage", equation: "Q_l = Q_main − Σ Q", inputs: { Q_main: flow(main.measured), "Σ Q": flow(totals.measured) }, value: flow(main.measured - totals.measured), source: "Continuity" });
  }
}
