"use client";

import { useState, useSyncExternalStore } from "react";
import { Button } from "../actions/Button";
import { CodeBlock } from "../code/CodeBlock";
import { layOut, requestSamples } from "../code/requestSamples";
import { WorkingTable } from "../data/WorkingTable";
import { UncertaintyBars } from "../figures/UncertaintyBars";
import { Tabs } from "../layout/Tabs";
import { AnswerCells } from "./AnswerCells";
import { airflowRequest, EXAMPLE, numberIn, SLIP, type SheetEntries, type SheetField } from "./example";
import { ReadingsGrid } from "./ReadingsGrid";
import { SheetFigure } from "./SheetFigure";
import { useTryAirflow } from "./useTryAirflow";

const FIELDS: { name: SheetField; label: string; unit: string }[] = [
  { name: "width", label: "Outside width", unit: "in" },
  { name: "height", label: "Outside height", unit: "in" },
  { name: "lining", label: "Lining", unit: "in" },
  { name: "dryBulb", label: "Dry bulb", unit: "°F" },
  { name: "humidity", label: "Humidity", unit: "%" },
  { name: "altitude", label: "Altitude", unit: "ft" },
  { name: "design", label: "Design", unit: "ft³/min" },
];

/** A traverse sheet that calculates as it is filled in: every answer on it comes from the API. */
export function TraverseSheet() {
  const [entries, setEntries] = useState<SheetEntries>(EXAMPLE);
  const request = airflowRequest(entries);
  const { outcome, pending } = useTryAirflow(request);
  const origin = useSyncExternalStore(() => () => {}, () => location.origin, () => "");
  const answer = outcome?.kind === "answered" ? outcome.answer : null;
  const changed = JSON.stringify(entries) !== JSON.stringify(EXAMPLE);

  const setField = (name: SheetField, text: string) => setEntries({ ...entries, fields: { ...entries.fields, [name]: text } });
  const setReading = (line: number, point: number, text: string) =>
    setEntries({ ...entries, lines: entries.lines.map((row, l) => (l === line ? row.map((was, p) => (p === point ? text : was)) : row)) });

  return (
    <section aria-labelledby="sheet" className="border-2 border-ink rounded-sheet bg-card">
      <h2 id="sheet" className="border-b px-3.5 py-2 font-semibold">
        Traverse sheet <span className="font-normal text-muted">supply main, log-Tchebycheff, pitot-static probe from the top</span>
      </h2>
      <div className="grid grid-cols-2 gap-px border-b bg-rule sm:grid-cols-4 xl:grid-cols-[repeat(6,minmax(0,1fr))_minmax(0,1.4fr)]">
        {FIELDS.map((field) => (
          <Blank key={field.name} {...field} value={entries.fields[field.name]} onChange={(text) => setField(field.name, text)} />
        ))}
        <div aria-hidden className="bg-card xl:hidden" />
      </div>
      <div className="grid gap-px border-b bg-rule md:grid-cols-[minmax(0,20rem)_1fr]">
        <div className="bg-card px-3.5 py-3">
          <ReadingsGrid lines={entries.lines} onChange={setReading} />
          <p className="mt-3 text-small">
            Change any figure; the API calculates the sheet again. Or swap two digits of hole {SLIP.line + 1}, point {SLIP.point + 1}, and watch the figure and the checks.
          </p>
          <div className="mt-2 flex gap-2">
            <Button size="small" onClick={() => setReading(SLIP.line, SLIP.point, SLIP.written)}>
              Swap two digits
            </Button>
            <Button size="small" disabled={!changed} onClick={() => setEntries(EXAMPLE)}>
              Put back
            </Button>
          </div>
        </div>
        <div className="bg-card px-3.5 py-3">
          <SheetFigure request={request} answer={answer} />
        </div>
      </div>
      <AnswerCells outcome={outcome} pending={pending} incomplete={request === null} />
      <div className="border-t px-3.5 py-3">
        <Tabs
          label="The calculation behind the sheet"
          tabs={[
            { id: "working", label: "Working", content: answer?.working ? <WorkingTable steps={answer.working} maxHeight="20rem" /> : <None /> },
            { id: "uncertainty", label: "Uncertainty", content: answer ? <UncertaintyBars {...answer.uncertainty} /> : <None /> },
            {
              id: "request",
              label: "Request",
              content: request ? (
                <CodeBlock title="Request" hideTitle maxHeight="20rem" samples={requestSamples({ method: "POST", url: `${origin}/api/v1/calculations/airflow`, body: request })} />
              ) : (
                <None />
              ),
            },
            { id: "answer", label: "Answer", content: answer ? <CodeBlock title="Answer" hideTitle maxHeight="20rem" samples={[{ language: "JSON", code: layOut(answer) }]} /> : <None /> },
          ]}
        />
      </div>
    </section>
  );
}

const None = () => <p className="text-small text-muted">Stands here when the sheet has been calculated.</p>;

interface BlankProps {
  name: SheetField;
  label: string;
  unit: string;
  value: string;
  onChange: (text: string) => void;
}

/** A ruled cell of the form: its label above, what is written and the unit below. */
function Blank({ name, label, unit, value, onChange }: BlankProps) {
  const wrong = Number.isNaN(numberIn(value) ?? Number.NaN);
  return (
    <div className="bg-card px-3 py-1.5 focus-within:bg-action-wash focus-within:outline-2 focus-within:-outline-offset-2 focus-within:outline-action">
      <label htmlFor={`sheet-${name}`} className="block text-fine text-muted">
        {label}
      </label>
      <div className="flex items-baseline gap-1.5">
        <input
          id={`sheet-${name}`}
          inputMode="decimal"
          autoComplete="off"
          value={value}
          onChange={(event) => onChange(event.target.value)}
          aria-invalid={wrong || undefined}
          aria-describedby={wrong ? `sheet-${name}-error` : undefined}
          className="min-w-0 flex-1 border-b border-b-edge bg-transparent py-0.5 font-mono outline-none aria-[invalid=true]:border-b-rust"
        />
        <span className="font-mono text-fine text-muted">{unit}</span>
      </div>
      {wrong && (
        <p id={`sheet-${name}-error`} className="text-fine text-rust">
          Write a number
        </p>
      )}
    </div>
  );
}
