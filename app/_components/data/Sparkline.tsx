import { formatNumber } from "../format/number";

interface SparklineProps {
  /** In order of time, evenly spaced. */
  values: number[];
  /** What they are, for screen readers: "Requests a day, last 30 days". */
  label: string;
  width?: number;
  height?: number;
}

/** The course of a figure, without axes: the last point is the open one. */
export function Sparkline({ values, label, width = 120, height = 28 }: SparklineProps) {
  const greatest = Math.max(...values, 0);
  const inset = 3;
  const place = (value: number, index: number) => ({
    x: inset + (values.length > 1 ? (index / (values.length - 1)) * (width - 2 * inset) : 0),
    y: height - inset - (greatest > 0 ? value / greatest : 0) * (height - 2 * inset),
  });
  const places = values.map(place);
  const last = places.at(-1);
  const spoken = `${label}: least ${formatNumber(Math.min(...values))}, greatest ${formatNumber(greatest)}, last ${formatNumber(values.at(-1))}`;

  return (
    <svg role="img" aria-label={values.length ? spoken : `${label}: no values`} viewBox={`0 0 ${width} ${height}`} width={width} height={height} fill="none" className="text-action">
      <line x1="0" x2={width} y1={height - 0.5} y2={height - 0.5} stroke="var(--rule)" />
      <polyline points={places.map(({ x, y }) => `${x.toFixed(1)},${y.toFixed(1)}`).join(" ")} stroke="currentColor" strokeWidth="1.5" strokeLinejoin="round" />
      {last && <circle cx={last.x} cy={last.y} r="2.25" fill="var(--card)" stroke="currentColor" strokeWidth="1.5" />}
    </svg>
  );
}
