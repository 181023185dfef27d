import type { OperationDefinition } from "./define";
import { airDensity } from "./calculations/airDensity";
import { airflow } from "./calculations/airflow";
import { batch } from "./calculations/batch";
import { averageVelocity } from "./calculations/averageVelocity";
import { densityCorrection } from "./calculations/densityCorrection";
import { ductArea } from "./calculations/ductArea";

/** Every operation of the public API, in the order the reference shows them. */
export const OPERATIONS: OperationDefinition[] = [ductArea, airDensity, densityCorrection, averageVelocity, airflow, batch];

/** Groups of operations, with what the reference says of each. */
export const TAGS: Record<string, string> = {
  Calculations: "Arithmetic of a duct traverse. Nothing is stored; the same request always gives the same answer.",
};
