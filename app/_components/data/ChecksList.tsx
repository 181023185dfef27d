import type { Check } from "@/lib/airflow/checks/check";
import { Sign, type Standing } from "../layout/signs";

const STANDING: Record<Check["severity"], Standing> = { information: "information", caution: "caution", failure: "failure" };
const WORD: Record<Check["severity"], string> = { information: "Note", caution: "Caution", failure: "Failure" };

/** The checks of a plan or a result: those that failed with what to do, then those that passed. */
export function ChecksList({ checks }: { checks: Check[] }) {
  const failed = checks.filter(({ passed }) => !passed);
  const passed = checks.filter((check) => check.passed);
  return (
    <ul className="grid gap-1.5 text-small">
      {failed.map((check) => (
        <li key={check.code} className="flex gap-2">
          <span className="mt-0.5">
            <Sign standing={STANDING[check.severity]} size={15} />
          </span>
          <span className="min-w-0">
            <strong className="font-semibold">{WORD[check.severity]}.</strong> {check.detail} <code className="text-muted">{check.code}</code>
          </span>
        </li>
      ))}
      {passed.length > 0 && (
        <li className="flex gap-2">
          <span className="mt-0.5">
            <Sign standing="good" size={15} />
          </span>
          <span className="min-w-0">
            <strong className="font-semibold">Passed.</strong> <span className="text-muted">{passed.map(({ code }) => code).join(", ")}</span>
          </span>
        </li>
      )}
    </ul>
  );
}
