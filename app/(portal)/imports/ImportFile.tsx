"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { Checkbox } from "@/app/_components/forms/Checkbox";
import { Field } from "@/app/_components/forms/Field";
import { Select, type Choice } from "@/app/_components/forms/Select";
import { TextArea } from "@/app/_components/forms/TextArea";
import { formatNumber } from "@/app/_components/format/number";
import { Notice } from "@/app/_components/layout/Notice";
import { Loading } from "@/app/_components/mark/Loading";
import type { ImportReport } from "@/lib/records/imports/fault";
import { Report } from "./Report";
import { sendFile } from "./sendFile";

type Mode = "dry_run" | "commit";
type State = { kind: "idle" } | { kind: "working"; mode: Mode; sent: number } | { kind: "answered"; report: ImportReport } | { kind: "refused"; message: string };

/** Chooses a file or takes pasted rows, has them checked, and has their drafts made. */
export function ImportFile({ projects }: { projects: Choice[] }) {
  const router = useRouter();
  const [file, setFile] = useState<File | null>(null);
  const [pasted, setPasted] = useState("");
  const [projectId, setProjectId] = useState("");
  const [decimalComma, setDecimalComma] = useState(false);
  const [state, setState] = useState<State>({ kind: "idle" });
  const content = file ?? (pasted.trim() === "" ? null : new Blob([pasted]));

  const send = async (mode: Mode): Promise<void> => {
    if (!content) return;
    setState({ kind: "working", mode, sent: 0 });
    const options = new URLSearchParams({ mode, name: file?.name.slice(0, 200) ?? "Pasted rows", decimalComma: String(decimalComma), ...(projectId && { projectId }) });
    const answer = await sendFile(options, content, (sent) => setState({ kind: "working", mode, sent }));
    setState("report" in answer ? { kind: "answered", report: answer.report } : { kind: "refused", message: answer.refusal });
    if (mode === "commit") router.refresh();
  };
  const change = (set: () => void): void => {
    set();
    setState({ kind: "idle" });
  };
  const report = state.kind === "answered" ? state.report : null;

  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
      <form className="grid max-w-2xl gap-4" onSubmit={(event) => { event.preventDefault(); void send("dry_run"); }}>
        <Field label="CSV file" hint="Comma, semicolon or tab between the cells; up to 5 MiB and 5,000 rows." id="file">
          {(control) => <input {...control} type="file" accept=".csv,.tsv,text/csv,text/tab-separated-values" className="blank" onChange={(event) => change(() => setFile(event.target.files?.[0] ?? null))} />}
        </Field>
        {!file && (
          <TextArea name="pasted" label="Or rows from a spreadsheet" hint="Copy them with their headings and paste them here." mono rows={3} wrap="off" value={pasted} onChange={(event) => change(() => setPasted(event.target.value))} />
        )}
        <Select name="projectId" label="Project" hint="For rows that name none." choices={[{ value: "", label: "The file names it" }, ...projects]} value={projectId} onChange={(event) => change(() => setProjectId(event.target.value))} />
        <Checkbox name="decimalComma" label="Numbers are written with a decimal comma" checked={decimalComma} onChange={(event) => change(() => setDecimalComma(event.target.checked))} />
        <div className="flex flex-wrap gap-2">
          <Button type="submit" variant={report?.faultCount === 0 ? "plain" : "primary"} disabled={!content || state.kind === "working"} pending={state.kind === "working" && state.mode === "dry_run"}>
            Check the file
          </Button>
          {report?.mode === "dry_run" && report.faultCount === 0 && report.traverses.length > 0 && (
            <Button variant="primary" onClick={() => void send("commit")}>
              {`Make ${report.traverses.length} ${report.traverses.length === 1 ? "draft" : "drafts"}`}
            </Button>
          )}
        </div>
      </form>
      <div aria-live="polite">
        {state.kind === "working" && <Progress {...state} />}
        {state.kind === "refused" && <Notice kind="failure" title="The file was not taken">{state.message}</Notice>}
        {report && <Report report={report} />}
      </div>
    </div>
  );
}

/** How far the file has been sent, and what is done with it once it is there. */
function Progress({ mode, sent }: { mode: Mode; sent: number }) {
  if (sent < 1) {
    return (
      <p className="flex flex-wrap items-center gap-3">
        <progress value={sent} max={1} aria-label="Sending the file" className="accent-action" />
        <span className="text-muted">Sending the file: {formatNumber(100 * sent, { decimals: 0 })} %</span>
      </p>
    );
  }
  return <Loading label={mode === "dry_run" ? "Checking every row" : "Making the drafts, all together"} />;
}
