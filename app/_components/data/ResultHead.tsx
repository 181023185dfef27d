import { VerdictBand } from "../figures/VerdictBand";
import { formatNumber, formatQuantity, unitSymbol } from "../format/number";
import type { AirflowAnswer } from "@/lib/airflow/calculations/airflow";

/** The airflow, how sure it is, and what it says of the design. */
export function ResultHead({ result: { airflow, averageVelocity, area, air, uncertainty, design } }: { result: AirflowAnswer }) {
  const facts = [
    ["Standard", formatQuantity(airflow.standard, { decimals: 0 })],
    ["Mass", formatQuantity(airflow.mass, { significant: 4 })],
    ["Average velocity", formatQuantity(averageVelocity, { significant: 4 })],
    ["Area inside", formatQuantity(area, { significant: 4 })],
    ["Air density", formatQuantity(air.density, { significant: 4 })],
  ];
  return (
    <section aria-label="Result" className="grid gap-x-8 gap-y-4 border-y-2 border-y-ink py-4 md:grid-cols-[minmax(0,18rem)_1fr]">
      <div>
        <p className="text-small text-muted">Actual airflow</p>
        <p className="font-mono text-figure font-semibold">
          {formatNumber(airflow.actual.value, { decimals: 0 })} <span className="text-small font-normal text-muted">{unitSymbol(airflow.actual.unit)}</span>
        </p>
        <p className="font-mono text-small text-muted">
          ± {formatQuantity(uncertainty.expanded, { decimals: 0 })} (k = {formatNumber(uncertainty.coverageFactor)})
        </p>
        <dl className="mt-3 border-t text-small">
          {facts.map(([term, value]) => (
            <div key={term} className="flex justify-between gap-3 border-b py-1">
              <dt className="text-muted">{term}</dt>
              <dd className="font-mono">{value}</dd>
            </div>
          ))}
        </dl>
      </div>
      {design ? (
        <div>
          <p className="mb-2 text-small text-muted">
            {formatNumber(design.percent, { decimals: 1 })} % of the design airflow, {design.basis}
          </p>
          <VerdictBand
            measured={(design.basis === "standard" ? airflow.standard : airflow.actual).value}
            design={design.airflow.value}
            tolerancePercent={design.tolerancePercent}
            expandedUncertainty={design.expandedUncertainty.value}
            unit={design.airflow.unit}
            verdict={design.verdict}
          />
        </div>
      ) : (
        <p className="text-small text-muted">No design airflow was given to compare with.</p>
      )}
    </section>
  );
}
