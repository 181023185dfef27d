import { numberIn } from "./example";

interface ReadingsGridProps {
  lines: string[][];
  onChange: (line: number, point: number, text: string) => void;
}

/** The readings as they are written on site: a column for each hole, a row for each depth. */
export function ReadingsGrid({ lines, onChange }: ReadingsGridProps) {
  const depth = Math.max(...lines.map((line) => line.length));
  const wrong = lines.flatMap((line, l) => line.flatMap((text, p) => (Number.isNaN(numberIn(text)) ? [{ line: l, point: p, text }] : [])));

  return (
    <div>
      <table className="w-full border-collapse font-mono text-small">
        <caption className="pb-2 text-left font-sans">
          Velocity pressure, in. w.g. <span className="text-muted">An empty blank is a point that could not be read.</span>
        </caption>
        <thead>
          <tr className="border-t-2 border-b border-t-ink border-b-ink">
            <th scope="col" className="w-12 py-1 text-left font-sans text-fine font-normal text-muted">
              Point
            </th>
            {lines.map((_, line) => (
              <th key={line} scope="col" className="py-1 text-center font-sans text-fine font-normal text-muted">
                <span className="sr-only sm:not-sr-only">Hole </span>
                {line + 1}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {Array.from({ length: depth }, (_, point) => (
            <tr key={point} className="border-b">
              <th scope="row" className="text-left font-normal text-muted">
                {point + 1}
              </th>
              {lines.map((line, index) => (
                <td key={index} className="border-l p-0">
                  <input
                    aria-label={`Hole ${index + 1}, point ${point + 1}`}
                    inputMode="decimal"
                    autoComplete="off"
                    value={line[point] ?? ""}
                    onChange={(event) => onChange(index, point, event.target.value)}
                    aria-invalid={Number.isNaN(numberIn(line[point] ?? "")) || undefined}
                    className="block h-9.5 w-full min-w-0 bg-transparent px-1 text-center -outline-offset-2 focus:bg-action-wash aria-[invalid=true]:text-rust aria-[invalid=true]:underline"
                  />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <ul aria-live="polite" className="mt-2 text-small text-rust">
        {wrong.map(({ line, point, text }) => (
          <li key={`${line}/${point}`}>
            Hole {line + 1}, point {point + 1}: “{text}” is not a number.
          </li>
        ))}
      </ul>
    </div>
  );
}
