"use client";

import { useEffect, useMemo, useState, useSyncExternalStore } from "react";
import { CopyButton } from "../actions/CopyButton";
import { CodeBlock } from "../code/CodeBlock";
import { requestSamples } from "../code/requestSamples";
import { ChecksList } from "../data/ChecksList";
import { ResultHead } from "../data/ResultHead";
import { WorkingTable } from "../data/WorkingTable";
import { Figure } from "../figures/Figure";
import { UncertaintyBars } from "../figures/UncertaintyBars";
import { unitSymbol } from "../format/number";
import { Notice } from "../layout/Notice";
import { SectionHead } from "../layout/SectionHead";
import { Tabs } from "../layout/Tabs";
import { BenchFields } from "./BenchFields";
import { BLANK_SHEET, BLANK_UNITS, fragmentOf, sheetFrom, unreadable, type BenchSheet } from "./benchSheet";
import { calculate, fittedLines } from "./calculate";
import { ReadingsSheet } from "./ReadingsSheet";
import { SaveAsRecord } from "./SaveAsRecord";

/** A drawing set for a page, and for a telephone. */
const WIDE = 540;
const NARROW = 360;
const NARROW_SCREEN = "(max-width: 640px)";

interface BenchProps {
  /** Projects that a sheet can be kept in; null for those who may not. */
  projects: { id: string; name: string }[] | null;
}

/** A calculation tried by hand: plan, figure and answer follow every key, computed by the engine right here. */
export function Bench({ projects }: BenchProps) {
  const [sheet, setSheet] = useState<BenchSheet>(BLANK_SHEET);
  useFragment(sheet, setSheet);
  const isNarrow = useSyncExternalStore(onScreenChange, () => matchMedia(NARROW_SCREEN).matches, () => false);
  const origin = useSyncExternalStore(() => () => {}, () => location.origin, () => "");
  const outcome = useMemo(() => calculate(sheet, isNarrow ? NARROW : WIDE), [sheet, isNarrow]);
  const { request, answer, holes, figure, faults } = outcome;
  const lines = holes ? fittedLines(sheet.lines, holes) : sheet.lines;
  const suspected = new Set(answer?.checks.find(({ code, passed }) => code === "possible_slip" && !passed)?.at?.map(({ line, point }) => `${line}/${point}`));
  const units = BLANK_UNITS[sheet.units];

  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
      <BenchFields sheet={sheet} wrong={unreadable(sheet)} onChange={(change) => setSheet({ ...sheet, ...change })} />
      {faults.length > 0 && (
        <Notice kind="failure" title="This cannot be" live>
          <ul>
            {faults.map(({ code, detail }) => (
              <li key={code}>{detail}</li>
            ))}
          </ul>
        </Notice>
      )}
      <div className="grid gap-6 xl:grid-cols-[auto_minmax(0,1fr)]">
        <section aria-label="Readings" className="min-w-0">
          {lines.length > 0 && <ReadingsSheet lines={lines} unit={unitSymbol(sheet.kind === "velocity" ? units.velocity : units.pressure)} suspected={suspected} onChange={(next) => setSheet({ ...sheet, lines: next })} />}
        </section>
        <section aria-label="Figure" className="min-w-0">
          {figure ? <Figure svg={figure} /> : <p className="text-muted">The drawing stands here once the duct is described.</p>}
        </section>
      </div>
      {answer && request && (
        <>
          <ResultHead result={answer} />
          <ChecksList checks={answer.checks} />
          <Tabs
            label="The calculation"
            tabs={[
              { id: "working", label: "Working", content: <WorkingTable steps={answer.working ?? []} maxHeight="24rem" /> },
              { id: "uncertainty", label: "Uncertainty", content: <UncertaintyBars {...answer.uncertainty} /> },
              { id: "request", label: "Request", content: <CodeBlock title="Request" hideTitle maxHeight="24rem" samples={requestSamples({ method: "POST", url: `${origin}/api/v1/calculations/airflow`, body: request })} /> },
            ]}
          />
        </>
      )}
      <section aria-labelledby="keep" className="no-print">
        <SectionHead id="keep">Keep it</SectionHead>
        <div className="grid gap-5 md:grid-cols-2">
          <div>
            <p className="mb-2 text-muted">The link holds the whole sheet behind its # and is sent to no server. Nothing of it is stored.</p>
            <CopyButton text={`${origin}/bench${fragmentOf({ ...sheet, lines })}`} what="link" />
          </div>
          {projects && <SaveAsRecord projects={projects} request={request} enterFrom={sheet.enterFrom} />}
        </div>
      </section>
    </div>
  );
}

function onScreenChange(listener: () => void): () => void {
  const query = matchMedia(NARROW_SCREEN);
  query.addEventListener("change", listener);
  return () => query.removeEventListener("change", listener);
}

/** Takes the sheet from the address at first, and keeps the address up with it, so that a reload loses nothing. */
function useFragment(sheet: BenchSheet, setSheet: (sheet: BenchSheet) => void): void {
  const [taken, setTaken] = useState(false);
  useEffect(() => {
    const take = (): void => setSheet(sheetFrom(location.hash) ?? BLANK_SHEET);
    // The address is known only in the browser, after the page from the server has been shown as it was.
    queueMicrotask(() => {
      take();
      setTaken(true);
    });
    // A link to another sheet, opened where the Bench is open already.
    addEventListener("hashchange", take);
    return () => removeEventListener("hashchange", take);
  }, [setSheet]);
  useEffect(() => {
    if (taken) history.replaceState(null, "", sheet === BLANK_SHEET ? location.pathname : fragmentOf(sheet));
  }, [sheet, taken]);
}
