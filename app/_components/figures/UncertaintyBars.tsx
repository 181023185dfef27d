import type { Influence, InfluenceName } from "@/lib/airflow/uncertainty/budget";
import { Table } from "../data/Table";
import { formatNumber } from "../format/number";

interface UncertaintyBarsProps {
  budget: Influence[];
  combinedPercent: number;
  coverageFactor: number;
  expandedPercent: number;
  /** Tells it from another on the same page. */
  caption?: string;
}

const NAMES: Record<InfluenceName, string> = {
  instrument: "Instrument",
  fluctuation: "Reading fluctuation",
  layout: "Layout and count",
  site: "Site",
  area: "Area",
  density: "Density",
  rounding: "Rounding of readings",
};

/** The uncertainty budget, row by row, each with a bar to the scale of the combined uncertainty. */
export function UncertaintyBars({ budget, combinedPercent, coverageFactor, expandedPercent, caption = "Uncertainty budget" }: UncertaintyBarsProps) {
  const write = (percent: number) => `${formatNumber(percent, { decimals: 2 })} %`;
  const length = (percent: number) => `${combinedPercent > 0 ? (100 * percent) / combinedPercent : 0}%`;
  return (
    <Table caption={caption} hideCaption>
      <thead>
        <tr>
          <th scope="col">Influence</th>
          <th scope="col" className="numeric">
            u
          </th>
          <th scope="col">Against the combined</th>
          <th scope="col">Origin</th>
          <th scope="col">From</th>
        </tr>
      </thead>
      <tbody>
        {budget.map(({ name, percent, origin, detail }) => (
          <tr key={name}>
            <th scope="row" className="whitespace-nowrap">
              {NAMES[name]}
            </th>
            <td className="numeric">{write(percent)}</td>
            <td className="min-w-32">
              <span aria-hidden className="mt-1.5 block h-2 bg-action" style={{ width: length(percent) }} />
            </td>
            <td>{origin}</td>
            <td className="min-w-56 text-muted">{detail}</td>
          </tr>
        ))}
        <tr className="font-semibold">
          <th scope="row">Combined</th>
          <td className="numeric">{write(combinedPercent)}</td>
          <td>
            <span aria-hidden className="mt-1.5 block h-2 w-full bg-ink" />
          </td>
          <td />
          <td className="font-normal text-muted">In quadrature</td>
        </tr>
        <tr className="font-semibold">
          <th scope="row">Expanded</th>
          <td className="numeric">{write(expandedPercent)}</td>
          <td />
          <td />
          <td className="font-normal text-muted">k = {formatNumber(coverageFactor)}</td>
        </tr>
      </tbody>
    </Table>
  );
}
