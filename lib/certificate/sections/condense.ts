import type { Influence } from "@/lib/airflow/uncertainty/budget";
import type { Quantity } from "@/lib/airflow/units/units";
import type { WorkingStep } from "@/lib/airflow/working/working";

/** A step as the certificate shows it: with only those inputs that no step before it has found. */
export interface CondensedStep {
  step: string;
  equation: string;
  value: Quantity | null;
  given: [symbol: string, value: Quantity][];
}

const AT_A_POINT = /^(\w+) at line \d+, point \d+$/;

const key = (symbol: string, { value, unit }: Quantity): string => `${symbol} ${value} ${unit}`;

/**
 * The working without repetition: steps that are the same at many points stand once (their values are in the table of
 * readings), and an input that an earlier step found, or took, or that the budget has, is not written again.
 */
export function condense(steps: readonly WorkingStep[], budget: readonly Influence[]): CondensedStep[] {
  const known = new Set(budget.map(({ name, percent }) => key(`u_${name}`, { value: percent, unit: "percent" })));
  const seen = new Map<string, CondensedStep>();
  const condensed: CondensedStep[] = [];
  for (const { step, equation, inputs, value } of steps) {
    const [, quantity] = AT_A_POINT.exec(step) ?? [];
    const given = Object.entries(inputs).filter(([symbol, input]) => !known.has(key(symbol, input)) && !known.has(key("", input)));
    if (quantity === undefined) {
      condensed.push({ step, equation, value, given });
      for (const [symbol, input] of given) known.add(key(symbol, input));
      known.add(key("", value));
      continue;
    }
    const before = seen.get(`${quantity} ${equation}`);
    if (before) {
      // What differs from point to point is the reading itself, which the table has.
      before.given = before.given.filter(([symbol, input]) => inputs[symbol]?.value === input.value);
      continue;
    }
    const once = { step: `${quantity} at each point`, equation, value: null, given };
    seen.set(`${quantity} ${equation}`, once);
    condensed.push(once);
  }
  return condensed;
}
