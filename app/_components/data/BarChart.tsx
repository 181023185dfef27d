"use client";

import { useId, useState } from "react";
import { Button } from "../actions/Button";
import { formatNumber } from "../format/number";
import { DataTable } from "./DataTable";
import { axisTicks } from "./axisTicks";

export interface Bar {
  /** What the bar is of: a day as "2026-12-01", an operation's name. */
  label: string;
  /** One value for each series, in the same order. */
  values: number[];
}

interface BarChartProps {
  title: string;
  /** Head of the table's first column: "Day". */
  of: string;
  /** Names of the stacked parts; one for a plain chart. At most six. */
  series: string[];
  bars: Bar[];
  /** What is counted: "requests". */
  unit: string;
}

const HEIGHT = 190;
const TOP = 10;
const BOTTOM = 24;
const LEFT = 52;
const WIDTH = 720;
const colourOf = (index: number) => `var(--series-${(index % 6) + 1})`;
const total = ({ values }: Bar) => values.reduce((sum, value) => sum + value, 0);

/** Bars by day or by operation, stacked where there are several series, with the same figures as a table. */
export function BarChart({ title, of, series, bars, unit }: BarChartProps) {
  const [asTable, setAsTable] = useState(false);
  const id = useId();
  const sum = bars.reduce((all, bar) => all + total(bar), 0);

  return (
    <figure aria-labelledby={id} className="min-w-0">
      <figcaption className="mb-2 flex flex-wrap items-center justify-between gap-x-4 gap-y-1">
        <span id={id} className="font-semibold">
          {title}
        </span>
        <Button size="small" onClick={() => setAsTable(!asTable)}>
          {asTable ? "Show the chart" : "Show the table"}
        </Button>
      </figcaption>
      {asTable ? (
        <DataTable
          caption={title}
          hideCaption
          columns={[
            { key: "label", header: of },
            ...series.map((name, index) => ({ key: String(index), header: name, numeric: true })),
            ...(series.length > 1 ? [{ key: "total", header: "Total", numeric: true }] : []),
          ]}
          rows={bars.map((bar) => ({
            id: bar.label,
            cells: { label: bar.label, total: total(bar), ...Object.fromEntries(bar.values.map((value, index) => [String(index), value])) },
          }))}
        />
      ) : (
        <>
          <div role="region" aria-label={`${title}, chart`} tabIndex={0} className="overflow-x-auto">
            <Drawing bars={bars} unit={unit} spoken={`${title}: ${formatNumber(sum)} ${unit} in all. The table has each figure.`} />
          </div>
          {series.length > 1 && (
            <ul className="mt-1 flex flex-wrap gap-x-4 gap-y-1 text-small">
              {series.map((name, index) => (
                <li key={name} className="flex items-center gap-1.5">
                  <span aria-hidden className="size-2.5" style={{ background: colourOf(index) }} />
                  {name}
                </li>
              ))}
            </ul>
          )}
        </>
      )}
    </figure>
  );
}

function Drawing({ bars, unit, spoken }: { bars: Bar[]; unit: string; spoken: string }) {
  const ticks = axisTicks(Math.max(...bars.map(total), 0));
  const top = ticks.at(-1) ?? 1;
  const floor = HEIGHT - BOTTOM;
  const heightOf = (value: number) => (value / top) * (floor - TOP);
  const step = (WIDTH - LEFT) / Math.max(bars.length, 1);
  const width = Math.min(step * 0.72, 40);
  const everyNth = Math.ceil(bars.length / 8);

  return (
    <svg role="img" aria-label={spoken} viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="block w-full min-w-130 font-mono" fontSize="11">
      {ticks.map((tick) => (
        <g key={tick} transform={`translate(0 ${floor - heightOf(tick)})`}>
          <line x1={LEFT} x2={WIDTH} stroke={tick === 0 ? "var(--ink)" : "var(--rule)"} />
          <text x={LEFT - 8} dy="0.35em" textAnchor="end" fill="var(--muted)">
            {formatNumber(tick)}
          </text>
        </g>
      ))}
      {bars.map((bar, index) => {
        const x = LEFT + step * (index + 0.5);
        return (
          <g key={bar.label}>
            <title>{`${bar.label}: ${formatNumber(total(bar))} ${unit}`}</title>
            <Stack values={bar.values} x={x - width / 2} width={width} floor={floor} heightOf={heightOf} />
            {index % everyNth === 0 && (
              <text x={x} y={floor + 16} textAnchor="middle" fill="var(--muted)">
                {shortLabel(bar.label)}
              </text>
            )}
          </g>
        );
      })}
    </svg>
  );
}

interface StackProps {
  values: number[];
  x: number;
  width: number;
  floor: number;
  heightOf: (value: number) => number;
}

function Stack({ values, x, width, floor, heightOf }: StackProps) {
  const below = (index: number) => values.slice(0, index).reduce((sum, value) => sum + value, 0);
  return values.map((value, index) => {
    const height = heightOf(value);
    // A sliver of card between the parts tells neighbours apart where their colours do not.
    return height > 0 && <rect key={index} x={x} y={floor - heightOf(below(index)) - height} width={width} height={Math.max(height - 1, 0.75)} fill={colourOf(index)} />;
  });
}

/** A day of the axis needs no year: "2026-12-01" → "12-01". */
const shortLabel = (label: string): string => label.replace(/^\d{4}-(?=\d{2}-\d{2}$)/, "");
