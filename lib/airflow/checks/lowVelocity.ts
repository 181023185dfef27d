import { ANSWER_UNITS } from "../units/units";
import { inAnswerUnits, toSi } from "../units/convert";
import type { CheckFunction } from "./context";

const LEAST_VELOCITY = toSi("velocity", { value: 600, unit: "ft/min" });

/** Average below 600 ft/min with a differential pressure instrument, whose readings are then too small to tell apart. */
export const lowVelocity: CheckFunction = ({ readings, instrument, traverse, system }) => {
  const sensesPressure = readings.kind === "velocity_pressure" || instrument?.principle === "differential_pressure";
  if (!sensesPressure) return null;
  const passed = traverse.average >= LEAST_VELOCITY;
  return {
    code: "low_velocity",
    passed,
    severity: "caution",
    detail: passed
      ? "The air is fast enough for a pitot-static probe."
      : "The air is slow for a pitot-static probe: the velocity pressures are near what a manometer can tell apart. A thermal or vane instrument measures better here.",
    compared: {
      quantity: "average velocity",
      value: inAnswerUnits("velocity", traverse.average, system).value,
      limit: inAnswerUnits("velocity", LEAST_VELOCITY, system).value,
      unit: ANSWER_UNITS[system].velocity,
    },
    source: "common practice, no source",
  };
};
