import type { Influence } from "@/lib/airflow/uncertainty/budget";
import type { Quantity } from "@/lib/airflow/units/units";
import type { WorkingStep } from "@/lib/airflow/working/working";

/** A step as the certificate shows it: with only those inputs that no step before it has found. */
export interface CondensedStep {
  step: string;
  equation: string;
  /** Null where the step stands for several points. */
  value: Quantity | null;
  given: [symbol: string, value: Quantity][];
}

const AT_A_POINT = /^(\w+) at line \d+, point \d+$/;

const key = (symbol: string, { value, unit }: Quantity): string => `${symbol} ${value} ${unit}`;

/** Steps that differ in nothing but the point. */
interface Repeated {
  once: CondensedStep;
  /** What is counted over the points: "Velocity". */
  quantity: string;
  count: number;
}

/**
 * The working without repetition: steps that are the same at many points stand once (readings and velocities are in the
 * table of readings), and an input that an earlier step found, or took, or that the budget has, is not written again.
 */
export function condense(steps: readonly WorkingStep[], budget: readonly Influence[]): CondensedStep[] {
  const known = new Set(budget.map(({ name, percent }) => key(`u_${name}`, { value: percent, unit: "percent" })));
  const repeated = new Map<string, Repeated>();
  const condensed: CondensedStep[] = [];
  for (const { step, equation, inputs, value } of steps) {
    const [, quantity] = AT_A_POINT.exec(step) ?? [];
    const before = quantity && repeated.get(`${quantity} ${equation}`);
    if (before) {
      before.count += 1;
      // What differs from point to point is the reading itself, which the table has.
      before.once.given = before.once.given.filter(([symbol, input]) => inputs[symbol]?.value === input.value);
      before.once.value = null;
      continue;
    }
    const given = Object.entries(inputs).filter(([symbol, input]) => !known.has(key(symbol, input)) && !known.has(key("", input)));
    const once = { step, equation, value, given };
    condensed.push(once);
    if (quantity) repeated.set(`${quantity} ${equation}`, { once, quantity, count: 1 });
    else for (const found of [...given.map(([symbol, input]) => key(symbol, input)), key("", value)]) known.add(found);
  }
  const points = steps.filter(({ step }) => AT_A_POINT.exec(step)?.[1] === "Velocity").length;
  for (const { once, quantity, count } of repeated.values()) if (count > 1) once.step = `${quantity} at ${count === points ? "each point" : `${count} points`}`;
  return condensed;
}
