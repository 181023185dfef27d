import type { FanPoint, FanRatios } from "./fanLaws";

export const FAN_WARNINGS = ["motor_overloaded", "motor_near_nameplate", "motor_not_checked", "speed_above_maximum", "speed_near_maximum", "speed_not_checked", "large_change", "system_unchanged", "lock_out"] as const;
export type FanWarningCode = (typeof FAN_WARNINGS)[number];

export interface FanWarning {
  code: FanWarningCode;
  severity: "information" | "caution" | "failure";
  detail: string;
  /** Standard or practice, and how surely. */
  source: string;
}

/** What is known of the limits of fan and motor, in SI. */
export interface FanLimits {
  /** Nameplate power of the motor in W. */
  motorPower: number | null;
  /** Greatest speed of the fan's class in 1/s. */
  maximumSpeed: number | null;
}

/** From this share of a limit on it is worth a word: a belt drive takes a few percent, and power rises with the cube. */
const NEAR = 0.9;
/** Beyond these changes of speed the fan is unlikely to work at the same point of its curve. */
const LARGEST_RISE = 1.25;
const LARGEST_FALL = 0.6;
const PRACTICE = "common practice, no source";

/** What to look at before the speed of a fan is changed. */
export function fanWarnings(atDesign: FanPoint, ratios: FanRatios, limits: FanLimits): FanWarning[] {
  const changes = Math.abs(ratios.speed - 1) > 1e-9;
  return [
    ...motorWarning(atDesign.power, limits.motorPower),
    ...speedWarning(atDesign.speed, ratios.speed, limits.maximumSpeed),
    ...(ratios.speed > LARGEST_RISE || ratios.speed < LARGEST_FALL ? [LARGE_CHANGE] : []),
    SYSTEM_UNCHANGED,
    ...(changes ? [LOCK_OUT] : []),
  ];
}

function motorWarning(power: number | null, nameplate: number | null): FanWarning[] {
  if (power === null || nameplate === null) {
    return [{ code: "motor_not_checked", severity: "caution", detail: "Power rises with the cube of the speed. Without measured power and the motor's nameplate it could not be checked that the motor carries it.", source: "Fan laws" }];
  }
  const share = power / nameplate;
  const percent = Math.round(100 * share);
  if (share > 1) return [{ code: "motor_overloaded", severity: "failure", detail: `The fan would take ${percent} % of the motor's nameplate power. A larger motor, with its starter and wiring, is needed first.`, source: "Nameplate power; NFPA 70 for the circuit, from memory" }];
  if (share > NEAR) return [{ code: "motor_near_nameplate", severity: "caution", detail: `The fan would take ${percent} % of the motor's nameplate power, before losses of the drive. Measure the current after the change and compare it with the nameplate.`, source: PRACTICE }];
  return [];
}

function speedWarning(speed: number, ratio: number, maximum: number | null): FanWarning[] {
  if (maximum === null) {
    return ratio <= 1 ? [] : [{ code: "speed_not_checked", severity: "caution", detail: "The fan is to run faster. Look up the greatest speed of its class, at its temperature, before changing the drive.", source: "AMCA 99, fan classes, from memory" }];
  }
  const percent = Math.round((100 * speed) / maximum);
  if (speed > maximum) return [{ code: "speed_above_maximum", severity: "failure", detail: `The speed would be ${percent} % of the greatest that the fan's class allows. Do not run it there: wheel or shaft can fail.`, source: "AMCA 99, fan classes, from memory" }];
  if (speed > NEAR * maximum) return [{ code: "speed_near_maximum", severity: "caution", detail: `The speed would be ${percent} % of the greatest that the fan's class allows. Look for the critical speed of the shaft and for vibration.`, source: PRACTICE }];
  return [];
}

const LARGE_CHANGE: FanWarning = { code: "large_change", severity: "caution", detail: "The change of speed is large. Go there in steps and measure at each: the fan laws hold only while the fan works at the same point of its curve.", source: PRACTICE };
const SYSTEM_UNCHANGED: FanWarning = { code: "system_unchanged", severity: "information", detail: "The fan laws hold for the same fan in the same system: dampers, filters, coils and terminals as they were when it was measured. Controls that hold a pressure break them. Measure again after the change.", source: "Fan laws" };
const LOCK_OUT: FanWarning = { code: "lock_out", severity: "caution", detail: "Lock out and tag out the fan, and wait until it stands still, before belts or sheaves are touched. Licensed or certified people do the electrical work.", source: "29 CFR 1910.147, from memory" };
