import { airDensity } from "./airDensity";
import { airflow } from "./airflow";
import { averageVelocity } from "./averageVelocity";
import { densityCorrection } from "./densityCorrection";
import { ductArea } from "./ductArea";
import { fanAdjustment } from "./fanAdjustment";
import { reconciliation } from "./reconciliation";
import { systemBalance } from "./systemBalance";
import { traversePlan } from "./traversePlan";

/** Every calculation, by the last part of its path in the API. */
export const CALCULATIONS = {
  "duct-area": ductArea,
  "traverse-plan": traversePlan,
  "air-density": airDensity,
  "density-correction": densityCorrection,
  "average-velocity": averageVelocity,
  airflow,
  reconciliation,
  "fan-adjustment": fanAdjustment,
  "system-balance": systemBalance,
};
