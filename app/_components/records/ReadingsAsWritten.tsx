import { writeReadings } from "@/lib/airflow/figure/writeReadings";
import type { Readings } from "@/lib/airflow/types";
import { Table } from "../data/Table";
import { unitSymbol } from "../format/number";
import { SectionHead } from "../layout/SectionHead";

/** Each reading as it was written down, line by line. */
export function ReadingsAsWritten({ readings: { kind, unit, lines } }: { readings: Readings }) {
  const most = Math.max(...lines.map((line) => line.length));
  const written = writeReadings(lines.flat());
  let next = 0;
  const rows = lines.map((line) => line.map(() => written[next++] ?? "not read"));
  return (
    <section aria-labelledby="readings">
      <SectionHead id="readings" measure={`${lines.flat().length} points`}>Readings as written</SectionHead>
      <Table caption={`${kind === "velocity" ? "Velocity" : "Velocity pressure"}, ${unitSymbol(unit)}`}>
        <thead>
          <tr>
            <th scope="col">Line</th>
            {Array.from({ length: most }, (_, index) => (
              <th key={index} scope="col" className="numeric">{index + 1}</th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => (
            <tr key={index}>
              <th scope="row">{index + 1}</th>
              {Array.from({ length: most }, (_, point) => (
                <td key={point} className="numeric font-mono">{row[point] ?? ""}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
