import { airDensity } from "./airDensity";
import { airflow } from "./airflow";
import { averageVelocity } from "./averageVelocity";
import { densityCorrection } from "./densityCorrection";
import { ductArea } from "./ductArea";

/** Every calculation, by the last part of its path in the API. */
export const CALCULATIONS = {
  "duct-area": ductArea,
  "air-density": airDensity,
  "density-correction": densityCorrection,
  "average-velocity": averageVelocity,
  airflow,
};
