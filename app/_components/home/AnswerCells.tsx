import type { AirflowAnswer } from "@/lib/airflow/calculations/airflow";
import type { Quantity } from "@/lib/airflow/units/units";
import { ChecksList } from "../data/ChecksList";
import { VerdictBand } from "../figures/VerdictBand";
import { formatNumber, unitSymbol } from "../format/number";
import { Notice } from "../layout/Notice";
import { Loading } from "../mark/Loading";
import type { Outcome } from "./useTryAirflow";

interface AnswerCellsProps {
  outcome: Outcome | null;
  pending: boolean;
  /** A blank is empty or holds no number, so that nothing was sent. */
  incomplete: boolean;
}

/** What the API answered to the sheet, or why it did not. */
export function AnswerCells({ outcome, pending, incomplete }: AnswerCellsProps) {
  if (incomplete) {
    return (
      <div className="px-3.5 py-3">
        <Notice kind="caution">A blank is empty or holds no number; the sheet was not sent.</Notice>
      </div>
    );
  }
  return (
    <div aria-busy={pending}>
      {outcome === null && (
        <div className="px-3.5">
          <Loading label="Calculating" />
        </div>
      )}
      {outcome?.kind === "unreachable" && (
        <div className="px-3.5 py-3">
          <Notice kind="failure" title="The API did not answer" live>
            The sheet could not be calculated. Check the connection, then change a reading or load the page again.
          </Notice>
        </div>
      )}
      {outcome?.kind === "refused" && (
        <div className="px-3.5 py-3">
          <Notice kind="failure" title={`${outcome.status} ${outcome.problem.title ?? "Refused"}`} live>
            {/* The detail sums up the errors; one of the two is enough. */}
            {outcome.problem.errors?.length ? (
              <ul>
                {outcome.problem.errors.map(({ pointer, detail }) => (
                  <li key={`${pointer} ${detail}`}>
                    {pointer && <code>{pointer}: </code>}
                    {detail}
                  </li>
                ))}
              </ul>
            ) : (
              <p>{outcome.problem.detail}</p>
            )}
          </Notice>
        </div>
      )}
      {outcome?.kind === "answered" && <Answered {...outcome} pending={pending} />}
    </div>
  );
}

interface AnsweredProps {
  answer: AirflowAnswer;
  status: number;
  milliseconds: number;
  pending: boolean;
}

function Answered({ answer, status, milliseconds, pending }: AnsweredProps) {
  const { airflow, averageVelocity, area, air, uncertainty, design } = answer;
  return (
    <div className="grid gap-px bg-rule md:grid-cols-[minmax(0,20rem)_1fr]">
      <div className="bg-card px-3.5 py-3">
        <p className="flex items-baseline justify-between text-small text-muted">
          Actual airflow
          <span role="status" className="font-mono text-fine">
            {pending ? "calculating" : `${status} in ${formatNumber(milliseconds, { decimals: 0 })} ms`}
          </span>
        </p>
        <p className="font-mono text-figure font-semibold">
          {formatNumber(airflow.actual.value, { decimals: 0 })}
          <span className="ml-2 text-small font-normal text-muted">{unitSymbol(airflow.actual.unit)}</span>
        </p>
        <p className="font-mono text-small text-muted">
          ± {formatNumber(uncertainty.expanded.value, { decimals: 0 })} (k = {formatNumber(uncertainty.coverageFactor)})
        </p>
        <dl className="mt-2 border-t text-small">
          <Line term="Standard" quantity={airflow.standard} decimals={0} />
          <Line term="Mass" quantity={airflow.mass} decimals={1} />
          <Line term="Average velocity" quantity={averageVelocity} decimals={0} />
          <Line term="Area inside" quantity={area} decimals={3} />
          <Line term="Air density" quantity={air.density} decimals={5} />
        </dl>
      </div>
      <div className="grid content-start gap-3 bg-card px-3.5 py-3">
        {design && (
          <VerdictBand
            measured={airflow.actual.value}
            design={design.airflow.value}
            tolerancePercent={design.tolerancePercent}
            expandedUncertainty={design.expandedUncertainty.value}
            unit={design.airflow.unit}
            verdict={design.verdict}
          />
        )}
        <ChecksList checks={answer.checks} />
      </div>
    </div>
  );
}

function Line({ term, quantity, decimals }: { term: string; quantity: Quantity; decimals: number }) {
  return (
    <div className="flex justify-between gap-3 border-b py-1">
      <dt className="text-muted">{term}</dt>
      <dd className="font-mono">
        {formatNumber(quantity.value, { decimals })} <span className="text-muted">{unitSymbol(quantity.unit)}</span>
      </dd>
    </div>
  );
}
