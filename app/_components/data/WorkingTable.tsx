import type { WorkingStep } from "@/lib/airflow/working/working";
import { formatQuantity } from "../format/number";
import { Table } from "./Table";

interface WorkingTableProps {
  steps: WorkingStep[];
  /** CSS length above which it scrolls within. */
  maxHeight?: string;
  /** Tells it from another on the same page. */
  caption?: string;
}

/** The steps of a result, complete enough to be redone by hand. */
export function WorkingTable({ steps, maxHeight, caption = "Working" }: WorkingTableProps) {
  return (
    <Table caption={caption} hideCaption maxHeight={maxHeight}>
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
            <th scope="row" className="min-w-32">
              {index + 1}. {step}
            </th>
            <td className="min-w-40 font-mono">{equation}</td>
            <td className="font-mono">
              {Object.entries(inputs).map(([symbol, input]) => (
                <span key={symbol} className="block whitespace-nowrap">
                  {symbol} = {formatQuantity(input)}
                </span>
              ))}
            </td>
            <td className="numeric font-semibold">{formatQuantity(value)}</td>
            <td className="min-w-36 text-muted">{source}</td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
