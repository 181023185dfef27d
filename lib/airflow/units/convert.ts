import { ANSWER_UNITS, UNITS, type QuantityKind, type QuantityOf, type UnitDefinition, type UnitOf, type UnitSystem } from "./units";

const definitionOf = (kind: QuantityKind, unit: string): UnitDefinition => (UNITS[kind] as Record<string, UnitDefinition>)[unit]!;

/**
 * The SI value of a quantity.
 * @param kind Which quantity it is, e.g. `"length"`.
 * @param quantity A number and its unit.
 * @returns Value in the SI unit of that quantity (m, m², m/s, Pa, K, kg/m³, m³/s, kg/s, 1/s, W, or a bare ratio).
 * @example toSi("length", { value: 24, unit: "in" }) // 0.6096
 */
export function toSi<Kind extends QuantityKind>(kind: Kind, quantity: QuantityOf<Kind>): number {
  const { factor, offset } = definitionOf(kind, quantity.unit);
  return quantity.value * factor + offset;
}

/**
 * A quantity in the given unit from its SI value.
 * @param kind Which quantity it is.
 * @param si Value in the SI unit of that quantity.
 * @param unit The unit wanted.
 * @returns The number in that unit, with the unit.
 * @example fromSi("length", 0.6096, "in") // { value: 24, unit: "in" }
 */
export function fromSi<Kind extends QuantityKind>(kind: Kind, si: number, unit: UnitOf<Kind>): QuantityOf<Kind> {
  const { factor, offset } = definitionOf(kind, unit);
  return { value: (si - offset) / factor, unit };
}

type AnswerKind = keyof (typeof ANSWER_UNITS)["ip"];
type KindOfAnswer<Answer extends AnswerKind> = Answer extends "absolutePressure" ? "pressure" : Extract<Answer, QuantityKind>;

/**
 * A quantity in the unit that answers in a system of units use.
 * @param answer Which quantity it is; absolute pressures have units of their own.
 * @param si Value in the SI unit of that quantity.
 * @param system Units of the answer.
 * @returns The number in the answer's unit, with the unit.
 * @example inAnswerUnits("length", 0.6096, "ip") // { value: 24, unit: "in" }
 */
export function inAnswerUnits<Answer extends AnswerKind>(answer: Answer, si: number, system: UnitSystem): QuantityOf<KindOfAnswer<Answer>> {
  const kind = (answer === "absolutePressure" ? "pressure" : answer) as KindOfAnswer<Answer>;
  return fromSi(kind, si, ANSWER_UNITS[system][answer] as unknown as UnitOf<KindOfAnswer<Answer>>);
}
