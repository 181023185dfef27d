import type { Verdict } from "@/lib/airflow/uncertainty/verdict";
import { formatNumber, unitSymbol } from "../format/number";
import { Status } from "../layout/Status";
import type { Standing } from "../layout/signs";

interface VerdictBandProps {
  measured: number;
  design: number;
  /** Half-width of the accepted band, percent of design. */
  tolerancePercent: number;
  /** Expanded uncertainty (k = 2), in the unit of the airflow; null where none was estimated. */
  expandedUncertainty: number | null;
  unit: string;
  verdict: Verdict;
}

const WORDS: Record<Verdict, { standing: Standing; text: string }> = {
  within: { standing: "good", text: "Within tolerance" },
  outside: { standing: "failure", text: "Outside tolerance" },
  undecided: { standing: "caution", text: "Undecided: the measurement cannot tell" },
};

const WIDTH = 360;
const HEIGHT = 46;
const MIDDLE = 20;

/** The figure with its uncertainty, laid on the band that the design allows. */
export function VerdictBand({ measured, design, tolerancePercent, expandedUncertainty, unit, verdict }: VerdictBandProps) {
  const tolerance = (design * tolerancePercent) / 100;
  const uncertainty = expandedUncertainty ?? 0;
  // Wide enough for the band with half of it at each side, and for a figure that lies far out.
  const reach = Math.max(2 * tolerance, (Math.abs(measured - design) + uncertainty) * 1.1);
  const place = (value: number) => ((value - design + reach) / (2 * reach)) * WIDTH;
  const low = place(measured - uncertainty);
  const high = place(measured + uncertainty);
  const write = (value: number) => formatNumber(value, { significant: 4 });
  const { standing, text } = WORDS[verdict];
  const spread = expandedUncertainty === null ? "" : ` ± ${formatNumber(expandedUncertainty, { significant: 2 })}`;

  return (
    <figure className="min-w-0">
      <svg
        role="img"
        aria-label={`${write(measured)}${spread} ${unitSymbol(unit)} measured against ${write(design)} ± ${formatNumber(tolerancePercent)} % design. ${text}.`}
        viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
        className="block w-full max-w-120 font-mono"
        fontSize="10.5"
        stroke="var(--ink)"
      >
        <rect x={place(design - tolerance)} y={MIDDLE - 9} width={place(design + tolerance) - place(design - tolerance)} height="18" fill="var(--action-wash)" stroke="var(--action)" />
        <line x1="0" x2={WIDTH} y1={MIDDLE} y2={MIDDLE} stroke="var(--edge)" />
        <line x1={WIDTH / 2} x2={WIDTH / 2} y1={MIDDLE - 13} y2={MIDDLE + 13} stroke="var(--action)" />
        <path d={`M${low} ${MIDDLE}H${high}M${low} ${MIDDLE - 5}V${MIDDLE + 5}M${high} ${MIDDLE - 5}V${MIDDLE + 5}`} strokeWidth="2" />
        <circle cx={place(measured)} cy={MIDDLE} r="4.5" fill="var(--card)" strokeWidth="2" />
        <g stroke="none" fill="var(--muted)" textAnchor="middle">
          <text x={place(design - tolerance)} y={HEIGHT - 4}>
            {write(design - tolerance)}
          </text>
          <text x={WIDTH / 2} y={HEIGHT - 4} fill="var(--ink)">
            {write(design)}
          </text>
          <text x={place(design + tolerance)} y={HEIGHT - 4}>
            {write(design + tolerance)}
          </text>
        </g>
      </svg>
      <figcaption className="mt-1 text-small">
        <Status standing={standing}>{text}</Status>
      </figcaption>
    </figure>
  );
}
