import type { Check } from "./check";
import { compressibility } from "./compressibility";
import type { CheckContext, CheckFunction } from "./context";
import { densityAssumed } from "./densityAssumed";
import { lowVelocity } from "./lowVelocity";
import { negativeReading } from "./negativeReading";
import { possibleSlip } from "./possibleSlip";
import { pointsBelowMinimum } from "./pointsBelowMinimum";
import { probeBlockage } from "./probeBlockage";
import { profileAsymmetry } from "./profileAsymmetry";
import { siteDisturbance } from "./siteDisturbance";
import { uniformity } from "./uniformity";

const CHECKS: CheckFunction[] = [pointsBelowMinimum, negativeReading, uniformity, lowVelocity, profileAsymmetry, possibleSlip, densityAssumed, compressibility, siteDisturbance, probeBlockage];

/** Every check that applies to a result, in a fixed order. */
export const runChecks = (context: CheckContext): Check[] => CHECKS.map((check) => check(context)).filter((check) => check !== null);
