import { LinkButton } from "../_components/actions/LinkButton";
import { OperationIndex } from "../_components/home/OperationIndex";
import { TraverseSheet } from "../_components/home/TraverseSheet";
import { SectionHead } from "../_components/layout/SectionHead";

const NOTES = [
  { head: "The working is in the answer.", text: "Equation, inputs, value and source of every step. A reviewer can redo it by hand." },
  { head: "Slips are named.", text: "A digit misread, two digits swapped, a reading left out, outside dimensions used, pressures averaged: reconciliation says which one explains the figure." },
  { head: "How sure is part of the figure.", text: "An uncertainty budget by the GUM, and a verdict against design that says undecided when the measurement cannot tell." },
  { head: "The instrument decides the correction.", text: "Differential-pressure, thermal and vane instruments each get their own." },
  { head: "One definition.", text: "The schema that checks a request also makes the reference, the OpenAPI document and its examples." },
];

export default function HomePage() {
  return (
    <div className="grid gap-x-8 gap-y-6 lg:grid-cols-[17rem_minmax(0,1fr)] lg:grid-rows-[auto_1fr]">
      <div>
        <h1 className="text-head font-semibold">Duct traverse readings in. Airflow out, with the working shown.</h1>
        <p className="mt-3">
          Averduct is an HTTP API for teams who write software for air balancing. Send the duct, the air and the readings. Get the airflow, how sure it is, and
          what looks wrong.
        </p>
        <div className="mt-4 flex flex-wrap gap-2">
          <LinkButton href="/sign-up" variant="primary">
            Create an account
          </LinkButton>
          <LinkButton href="/sign-in">Sign in</LinkButton>
          <LinkButton href="/docs">Docs</LinkButton>
          <LinkButton href="/docs/reference">API reference</LinkButton>
        </div>
      </div>
      <div className="min-w-0 lg:col-start-2 lg:row-span-2 lg:row-start-1">
        <TraverseSheet />
      </div>
      <div>
        <SectionHead measure={NOTES.length}>Notes</SectionHead>
        <ol className="text-small">
          {NOTES.map(({ head, text }, index) => (
            <li key={head} className="grid grid-cols-[1.5rem_1fr] border-t py-2">
              <span aria-hidden className="font-mono text-muted">
                {index + 1}
              </span>
              <span>
                <strong className="font-semibold">{head}</strong> <span className="text-muted">{text}</span>
              </span>
            </li>
          ))}
        </ol>
      </div>
      <div className="min-w-0 lg:col-span-2">
        <OperationIndex />
      </div>
    </div>
  );
}
