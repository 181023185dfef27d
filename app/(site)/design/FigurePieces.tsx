import { airflow, type AirflowInput } from "@/lib/airflow/calculations/airflow";
import { ChecksList } from "../../_components/data/ChecksList";
import { WorkingTable } from "../../_components/data/WorkingTable";
import { CrossSection } from "../../_components/figures/CrossSection";
import { DimensionLine } from "../../_components/figures/DimensionLine";
import { UncertaintyBars } from "../../_components/figures/UncertaintyBars";
import { VerdictBand } from "../../_components/figures/VerdictBand";
import { Piece } from "./Piece";

/** Two diameters of six points by log-linear; invented velocities. */
const DEPTHS = [0.032, 0.135, 0.321, 0.679, 0.865, 0.968];
const VELOCITIES = [
  [812, 934, 1010, 1004, 921, 806],
  [798, 926, 1310, 1009, null, 811],
];
const ROUND = VELOCITIES.flatMap((line, l) =>
  line.map((velocity, p) => {
    const depth = DEPTHS[p] ?? 0.5;
    return {
      line: l + 1,
      point: p + 1,
      x: l === 0 ? 0.5 : depth,
      y: l === 0 ? depth : 0.5,
      reading: velocity === null ? null : String(velocity),
      velocity,
      suspected: velocity === 1310,
    };
  }),
);

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
      <Piece name="figures/CrossSection">
        <div className="mx-auto max-w-96">
          <CrossSection duct={{ shape: "round", width: 14, height: 14, wall: 0, unit: "in" }} points={ROUND} readingUnit="ft/min" velocityUnit="ft/min" />
        </div>
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
