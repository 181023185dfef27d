"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { Checkbox } from "@/app/_components/forms/Checkbox";
import { Field } from "@/app/_components/forms/Field";
import { Select, type Choice } from "@/app/_components/forms/Select";
import { Notice } from "@/app/_components/layout/Notice";
import { Loading } from "@/app/_components/mark/Loading";
import type { ImportReport } from "@/lib/records/imports/fault";
import { Report } from "./Report";

type Mode = "dry_run" | "commit";
type State = { kind: "idle" } | { kind: "working"; mode: Mode } | { kind: "answered"; report: ImportReport } | { kind: "refused"; message: string };

/** Chooses a file, has it checked, and has its drafts made. */
export function ImportFile({ projects }: { projects: Choice[] }) {
  const router = useRouter();
  const [file, setFile] = useState<File | null>(null);
  const [projectId, setProjectId] = useState("");
  const [decimalComma, setDecimalComma] = useState(false);
  const [state, setState] = useState<State>({ kind: "idle" });

  const send = async (mode: Mode): Promise<void> => {
    if (!file) return;
    setState({ kind: "working", mode });
    const options = new URLSearchParams({ mode, name: file.name.slice(0, 200), decimalComma: String(decimalComma), ...(projectId && { projectId }) });
    setState(await answerTo(`/api/portal/imports?${options}`, file));
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
        <Field label="CSV file" hint="Comma, semicolon or tab between the cells; up to 5 MiB and 5,000 rows. Templates of both forms are in examples/csv." id="file">
          {(control) => <input {...control} type="file" accept=".csv,.tsv,text/csv,text/tab-separated-values" className="blank" onChange={(event) => change(() => setFile(event.target.files?.[0] ?? null))} />}
        </Field>
        <Select name="projectId" label="Project" hint="For rows that name none." choices={[{ value: "", label: "The file names it" }, ...projects]} value={projectId} onChange={(event) => change(() => setProjectId(event.target.value))} />
        <Checkbox name="decimalComma" label="Numbers are written with a decimal comma" checked={decimalComma} onChange={(event) => change(() => setDecimalComma(event.target.checked))} />
        <div className="flex flex-wrap gap-2">
          <Button type="submit" variant={report?.faultCount === 0 ? "plain" : "primary"} disabled={!file} pending={state.kind === "working" && state.mode === "dry_run"}>
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
        {state.kind === "working" && <Loading label={state.mode === "dry_run" ? "Reading and checking every row" : "Making the drafts"} />}
        {state.kind === "refused" && <Notice kind="failure" title="The file was not taken">{state.message}</Notice>}
        {report && <Report report={report} />}
      </div>
    </div>
  );
}

async function answerTo(address: string, file: File): Promise<State> {
  try {
    const response = await fetch(address, { method: "POST", headers: { "Content-Type": "text/csv" }, body: file });
    const content = (await response.json()) as ImportReport & { detail?: string };
    return response.ok ? { kind: "answered", report: content } : { kind: "refused", message: content.detail ?? "It could not be read. Try again." };
  } catch {
    return { kind: "refused", message: "The server could not be reached. Nothing was made; check the connection and try again." };
  }
}
