import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import { ChecksList } from "../../_components/data/ChecksList";
import { WorkingTable } from "../../_components/data/WorkingTable";
import { DimensionLine } from "../../_components/figures/DimensionLine";
import { Figure } from "../../_components/figures/Figure";
import { UncertaintyBars } from "../../_components/figures/UncertaintyBars";
import { VerdictBand } from "../../_components/figures/VerdictBand";
import { Piece } from "./Piece";

/** Two diameters of six points by log-linear; invented velocities, one of them with two digits swapped. */
const VELOCITIES = [
  [812, 934, 1010, 1004, 921, 806],
  [798, 926, 1310, 1009, null, 811],
];

const EXHAUST: AirflowInput = {
  duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } },
  readings: { kind: "velocity", unit: "ft/min", lines: VELOCITIES },
  layout: "log_linear",
  working: true,
};

export function FigurePieces({ theme }: { theme: string }) {
  const answer = airflow(EXHAUST);
  return (
    <>
      <Piece name="figures/Figure">
        <Figure svg={resultFigure({ ...EXHAUST, result: answer, width: 400 })} />
      </Piece>
      <Piece name="figures/VerdictBand">
        <div className="grid gap-4">
          <VerdictBand measured={2533} design={2600} tolerancePercent={10} expandedUncertainty={118} unit="ft3/min" verdict="within" />
          <VerdictBand measured={2380} design={2600} tolerancePercent={10} expandedUncertainty={118} unit="ft3/min" verdict="undecided" />
          <VerdictBand measured={1800} design={2600} tolerancePercent={10} expandedUncertainty={90} unit="ft3/min" verdict="outside" />
        </div>
      </Piece>
      <Piece name="figures/UncertaintyBars">
        <UncertaintyBars {...answer.uncertainty} caption={`Uncertainty budget, ${theme}`} />
      </Piece>
      <Piece name="data/ChecksList">
        <ChecksList checks={answer.checks} />
      </Piece>
      <Piece name="data/WorkingTable">
        <WorkingTable steps={answer.working ?? []} maxHeight="16rem" caption={`Working, ${theme}`} />
      </Piece>
      <Piece name="figures/DimensionLine">
        <DimensionLine>24 in inside</DimensionLine>
      </Piece>
    </>
  );
}
