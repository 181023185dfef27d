import type { OperationDefinition } from "./define";
import { airDensity } from "./calculations/airDensity";
import { airflow } from "./calculations/airflow";
import { batch } from "./calculations/batch";
import { averageVelocity } from "./calculations/averageVelocity";
import { densityCorrection } from "./calculations/densityCorrection";
import { ductArea } from "./calculations/ductArea";
import { fanAdjustment } from "./calculations/fanAdjustment";
import { reconciliation } from "./calculations/reconciliation";
import { systemBalance } from "./calculations/systemBalance";
import { traversePlan } from "./calculations/traversePlan";

/** Every operation of the public API, in the order the reference shows them. */
export const OPERATIONS: OperationDefinition[] = [ductArea, traversePlan, airDensity, densityCorrection, averageVelocity, airflow, reconciliation, fanAdjustment, systemBalance, batch];

/** Groups of operations, with what the reference says of each. */
export const TAGS: Record<string, string> = {
  Calculations: "Arithmetic of a duct traverse. Nothing is stored; the same request always gives the same answer.",
};
