import { useId } from "react";
import { formatNumber, unitSymbol } from "../format/number";
import { CIVIDIS_STEPS, cividis } from "./cividis";
import { outlinePath, type DuctOutline } from "./ductOutline";
import { placeLabel, RING, ROW_GAP, rowGap, type LabelPlace } from "./placeLabel";

export interface FigurePoint {
  line: number;
  point: number;
  /** Place inside the duct, as a fraction of its width from the left and of its height from the top. */
  x: number;
  y: number;
  /** As it was written down; null where the point could not be read. */
  reading: string | null;
  /** Colours the point; null leaves it open. */
  velocity: number | null;
  /** Ringed: the reading looks like a slip. */
  suspected?: boolean;
}

interface CrossSectionProps {
  duct: DuctOutline;
  points: FigurePoint[];
  velocityUnit: string;
  /** Unit of the readings, as requests name it. */
  readingUnit: string;
  /** Numbered holes, as fractions along the top face. */
  holes?: number[];
}

/** The drawing is 360 units wide; text in it is set for a figure shown at 300 to 480 pixels. */
const WIDTH = 360;
const SIDE = 26;
const HEAD = 30;
const FOOT = 62;

/** The duct's cross-section: where each point lies, what was read there, how fast the air was, which readings look wrong. */
export function CrossSection({ duct, points, velocityUnit, readingUnit, holes = [] }: CrossSectionProps) {
  const id = useId();
  const { width, height, wall, unit } = duct;
  const scale = Math.min((WIDTH - 2 * SIDE) / (width + 2 * wall), 300 / (height + 2 * wall));
  const w = width * scale;
  const h = height * scale;
  const left = (WIDTH - w) / 2;
  const top = HEAD + wall * scale;
  const total = top + h + wall * scale + FOOT;
  const velocities = points.flatMap(({ velocity }) => (velocity === null ? [] : [velocity]));
  const slowest = Math.min(...velocities);
  const fastest = Math.max(...velocities);
  const shareOf = (velocity: number) => (fastest > slowest ? (velocity - slowest) / (fastest - slowest) : 0.5);
  const slips = points.filter(({ suspected }) => suspected).length;
  const written = duct.shape !== "rectangular" || rowGap(points) * h >= ROW_GAP;
  const measure = (value: number) => `${formatNumber(value)} ${unitSymbol(unit)}`;

  return (
    <figure className="relative mx-auto max-w-110 min-w-0">
      <svg
        role="img"
        aria-label={`Cross-section, ${measure(width)} by ${measure(height)} inside, ${points.length} points${slips ? `, ${slips} with a suspected slip` : ""}. A table follows.`}
        viewBox={`0 0 ${WIDTH} ${total}`}
        className="block w-full font-mono text-ink"
        fontSize="10.5"
        fill="none"
        stroke="currentColor"
      >
        <defs>
          <pattern id={`${id}-lining`} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <line x1="0" y1="0" x2="0" y2="5" stroke="var(--edge)" strokeWidth="1" />
          </pattern>
          <linearGradient id={`${id}-scale`}>
            {CIVIDIS_STEPS.map((colour, index) => (
              <stop key={colour} offset={index / (CIVIDIS_STEPS.length - 1)} stopColor={colour} />
            ))}
          </linearGradient>
        </defs>

        {wall > 0 && <path d={outlinePath(duct, left, top, scale, wall)} fill={`url(#${id}-lining)`} strokeWidth="1" />}
        <path d={outlinePath(duct, left, top, scale, 0)} fill="var(--card)" strokeWidth="1.5" />

        {holes.map((x, index) => (
          <g key={index} transform={`translate(${left + x * w} ${top - wall * scale})`}>
            <line y1="-4" y2={h + wall * scale} stroke="var(--rule)" strokeDasharray="2 3" />
            <path d="M-3.5 -9L3.5 -9L0 -2.5z" fill="currentColor" stroke="none" />
            <text y="-14" textAnchor="middle" fill="currentColor" stroke="none">
              {index + 1}
            </text>
          </g>
        ))}

        {points.map((point) => (
          <g key={`${point.line}/${point.point}`} transform={`translate(${left + point.x * w} ${top + point.y * h})`}>
            <Point point={point} colour={point.velocity === null ? null : cividis(shareOf(point.velocity))} label={written && placeLabel(point, duct, h)} />
          </g>
        ))}

        <Measure x={left} y={top + h + wall * scale + 14} length={w} label={measure(width)} />
        <g transform={`translate(${left - wall * scale - 12} ${top + h}) rotate(-90)`}>
          <Measure x={0} y={0} length={h} label={measure(height)} />
        </g>

        {velocities.length > 0 && (
          <g transform={`translate(${left} ${total - 22})`} stroke="none" fill="currentColor">
            <rect width={w} height="5" fill={`url(#${id}-scale)`} stroke="currentColor" strokeWidth="0.75" />
            <text y="17">{formatNumber(slowest, { significant: 3 })}</text>
            <text x={w / 2} y="17" textAnchor="middle" fill="var(--muted)">
              velocity, {unitSymbol(velocityUnit)}
            </text>
            <text x={w} y="17" textAnchor="end">
              {formatNumber(fastest, { significant: 3 })}
            </text>
          </g>
        )}
      </svg>
      <PointsTable points={points} velocityUnit={velocityUnit} readingUnit={readingUnit} />
    </figure>
  );
}

interface PointProps {
  point: FigurePoint;
  colour: string | null;
  /** Where its reading is written; false where there is no room for readings and only the table has them. */
  label: LabelPlace | false;
}

function Point({ point, colour, label }: PointProps) {
  return (
    <>
      {point.suspected && <circle r={RING} stroke="var(--rust)" strokeWidth="2" />}
      <circle r="4.5" fill={colour ?? "var(--card)"} strokeWidth="1" />
      {label && point.reading !== null && (
        <text {...label} fill={point.suspected ? "var(--rust)" : "currentColor"} stroke="none">
          {point.reading}
        </text>
      )}
    </>
  );
}

/** A dimension line with slanted ticks; the figure interrupts it. */
function Measure({ x, y, length, label }: { x: number; y: number; length: number; label: string }) {
  const gap = label.length * 3.4 + 5;
  return (
    <g transform={`translate(${x} ${y})`} stroke="var(--edge)">
      <path d={`M0 -6V6M${length} -6V6M-3 3L3 -3M${length - 3} 3L${length + 3} -3`} />
      <path d={`M0 0H${length / 2 - gap}M${length / 2 + gap} 0H${length}`} />
      <text x={length / 2} dy="0.35em" textAnchor="middle" fill="currentColor" stroke="none">
        {label}
      </text>
    </g>
  );
}

function PointsTable({ points, velocityUnit, readingUnit }: Pick<CrossSectionProps, "points" | "velocityUnit" | "readingUnit">) {
  return (
    // Around the table, because a table does not shrink to the hidden size by itself.
    <div className="sr-only">
      <table>
        <caption>Points of the cross-section</caption>
        <thead>
          <tr>
            <th scope="col">Hole</th>
            <th scope="col">Point</th>
            <th scope="col">Reading, {unitSymbol(readingUnit)}</th>
            <th scope="col">Velocity, {unitSymbol(velocityUnit)}</th>
            <th scope="col">Suspected slip</th>
          </tr>
        </thead>
        <tbody>
          {points.map(({ line, point, reading, velocity, suspected }) => (
            <tr key={`${line}/${point}`}>
              <td>{line}</td>
              <td>{point}</td>
              <td>{reading ?? "not read"}</td>
              <td>{formatNumber(velocity, { significant: 4 })}</td>
              <td>{suspected ? "yes" : "no"}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
