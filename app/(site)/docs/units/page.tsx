import type { Metadata } from "next";
import { Table } from "@/app/_components/data/Table";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { ANSWER_UNITS, UNITS } from "@/lib/airflow/units/units";

export const metadata: Metadata = { title: "Units" };

const KIND_WORDS: Record<string, string> = { massFlow: "mass flow", specificVolume: "specific volume" };

export default function UnitsPage() {
  const answerUnits = new Set<string>([...Object.values(ANSWER_UNITS.ip), ...Object.values(ANSWER_UNITS.si)]);
  return (
    <>
      <PageHeader title="Units">
        A quantity is a number with its unit. Inside, everything is computed in SI with the exact factors of NIST SP 811; the inch of water is the conventional one, 249.08891 Pa.
      </PageHeader>
      <Table caption="Units by quantity">
        <thead>
          <tr>
            <th scope="col">Quantity</th>
            <th scope="col">Unit</th>
            <th scope="col">Name</th>
            <th scope="col">UCUM</th>
            <th scope="col" className="numeric">Factor to SI</th>
            <th scope="col">In answers</th>
          </tr>
        </thead>
        <tbody>
          {Object.entries(UNITS).flatMap(([kind, units]) =>
            Object.entries(units).map(([unit, { name, ucum, factor }]) => (
              <tr key={`${kind} ${unit}`}>
                <td>{KIND_WORDS[kind] ?? kind}</td>
                <th scope="row" className="font-mono text-small">{unit}</th>
                <td>{name}</td>
                <td className="font-mono text-small">{ucum}</td>
                <td className="numeric">{factor}</td>
                <td>{answerUnits.has(unit) ? "yes" : ""}</td>
              </tr>
            )),
          )}
        </tbody>
      </Table>
    </>
  );
}
