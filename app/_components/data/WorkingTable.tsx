import type { WorkingStep } from "@/lib/airflow/working/working";
import { formatNumber, unitSymbol } from "../format/number";
import { Table } from "./Table";

/** The steps of a result, complete enough to be redone by hand. */
export function WorkingTable({ steps }: { steps: WorkingStep[] }) {
  return (
    <Table caption="Working" hideCaption>
      <thead>
        <tr>
          <th scope="col">Step</th>
          <th scope="col">Equation</th>
          <th scope="col">With</th>
          <th scope="col" className="numeric">
            Value
          </th>
          <th scope="col">Source</th>
        </tr>
      </thead>
      <tbody>
        {steps.map(({ step, equation, inputs, value, source }, index) => (
          <tr key={index}>
            <th scope="row" className="min-w-40">
              {index + 1}. {step}
            </th>
            <td className="min-w-44 font-mono">{equation}</td>
            <td className="font-mono">
              {Object.entries(inputs).map(([symbol, input]) => (
                <span key={symbol} className="block whitespace-nowrap">
                  {symbol} = {measure(input)}
                </span>
              ))}
            </td>
            <td className="numeric font-semibold">{measure(value)}</td>
            <td className="min-w-44 text-muted">{source}</td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

const measure = ({ value, unit }: { value: number; unit: string }) => `${formatNumber(value)}${unit ? ` ${unitSymbol(unit)}` : ""}`;
