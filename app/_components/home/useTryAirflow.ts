import { useEffect, useState } from "react";
import type { AirflowAnswer, AirflowInput } from "@/lib/airflow/calculations/airflow";

/** RFC 9457, as far as the sheet shows it. */
interface ProblemDocument {
  title?: string;
  detail?: string;
  errors?: { pointer: string; detail: string }[];
}

export type Outcome =
  | { kind: "answered"; answer: AirflowAnswer; status: number; milliseconds: number }
  | { kind: "refused"; problem: ProblemDocument; status: number }
  | { kind: "unreachable" };

/** A visitor who types should not spend a request on every digit. */
const PAUSE_MS = 500;
const ADDRESS = "/api/portal/try/airflow";

/**
 * Sends the request to the real API, a moment after it last changed, and keeps the last outcome.
 *
 * @param request - Null while there is nothing fit to send.
 */
export function useTryAirflow(request: AirflowInput | null): { outcome: Outcome | null; pending: boolean } {
  const body = request && JSON.stringify(request);
  const [settled, setSettled] = useState<{ body: string; outcome: Outcome } | null>(null);

  useEffect(() => {
    if (body === null) return;
    const abort = new AbortController();
    const timer = setTimeout(async () => {
      try {
        setSettled({ body, outcome: await send(body, abort.signal) });
      } catch {
        if (!abort.signal.aborted) setSettled({ body, outcome: { kind: "unreachable" } });
      }
    }, PAUSE_MS);
    return () => {
      clearTimeout(timer);
      abort.abort();
    };
  }, [body]);

  return { outcome: settled?.outcome ?? null, pending: body !== null && settled?.body !== body };
}

async function send(body: string, signal: AbortSignal): Promise<Outcome> {
  const started = performance.now();
  const response = await fetch(ADDRESS, { method: "POST", headers: { "Content-Type": "application/json" }, body, signal });
  const content: unknown = await response.json();
  const milliseconds = performance.now() - started;
  return response.ok
    ? { kind: "answered", answer: content as AirflowAnswer, status: response.status, milliseconds }
    : { kind: "refused", problem: content as ProblemDocument, status: response.status };
}
