import Link from "next/link";
import { OPERATIONS } from "@/api-spec/registry";
import { formatCount } from "../format/number";
import { SectionHead } from "../layout/SectionHead";

const CALCULATIONS = OPERATIONS.filter(({ path }) => path.startsWith("/calculations/"));

/** The calculations that the API offers, from its own register. */
export function OperationIndex() {
  return (
    <section aria-labelledby="calculations">
      <SectionHead id="calculations" measure={formatCount(CALCULATIONS.length, "operation")}>
        Calculations
      </SectionHead>
      <ul className="grid border-t-2 border-t-ink text-small md:grid-cols-2 md:gap-x-8">
        {CALCULATIONS.map(({ id, method, path, summary }) => (
          <li key={id} className="grid gap-x-4 border-b py-1.5 sm:grid-cols-[20rem_1fr]">
            <code className="text-fine leading-5">
              <span className="text-muted uppercase">{method}</span> /api/v1{path}
            </code>
            <span>{summary}</span>
          </li>
        ))}
      </ul>
      <p className="mt-3 max-w-2xl">
        The{" "}
        <Link href="/docs/reference" className="link">
          API reference
        </Link>{" "}
        has each operation with examples that run.
      </p>
    </section>
  );
}
