import type { Metadata } from "next";
import Link from "next/link";
import { firstCallSamples } from "@/app/(portal)/firstCall";
import { CodeBlock } from "@/app/_components/code/CodeBlock";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import { config } from "@/lib/runtime/config";
import { KEY_PATTERN } from "@/lib/keys/keyText";

export const metadata: Metadata = { title: "Docs" };

export default function DocsPage() {
  return (
    <>
      <PageHeader title="First call">From an account to the airflow of a traverse in five minutes.</PageHeader>
      <div className="prose grid grid-cols-[minmax(0,1fr)] gap-8">
        <section>
          <SectionHead>1. Make a key</SectionHead>
          <p>
            <Link href="/sign-up" className="link">Create an account</Link>, confirm the e-mail, and <Link href="/keys/new" className="link">make a sandbox key</Link>. It is shown once; put it into the environment variable <code>AVERDUCT_KEY</code>.
          </p>
        </section>
        <section>
          <SectionHead>2. Send a traverse</SectionHead>
          <p>The duct, the readings as written, one list for each hole. The answer has the actual, standard and mass flow, the checks, the uncertainty and, on request, the working.</p>
          <CodeBlock title="Request" samples={firstCallSamples(config().AVERDUCT_URL)} />
        </section>
        <section>
          <SectionHead>3. Read the answer</SectionHead>
          <p>
            <code>airflow.actual</code> is area times average velocity. Each entry of <code>checks</code> says what was compared and where the limit comes from. <code>uncertainty.budget</code> lists every influence; rows of origin <code>default</code> are engineering judgement. With <code>design</code>, the verdict is <code>within</code>, <code>outside</code>, or <code>undecided</code> where the measurement cannot tell. With <code>&quot;working&quot;: true</code> every step comes with its equation, inputs, value and source.
          </p>
        </section>
        <section>
          <SectionHead>Keys</SectionHead>
          <p>
            A key belongs to one environment, <code>sandbox</code> or <code>production</code>, and has scopes. Send it as <code>Authorization: Bearer …</code>. To find keys that leaked into a repository or a log, search for:
          </p>
          <CodeBlock title="Regular expression" samples={[{ language: "text", code: KEY_PATTERN.source }]} />
        </section>
        <section>
          <SectionHead>Limits</SectionHead>
          <p>
            Every answer to a request with a key carries <code>RateLimit-Policy</code> and <code>RateLimit</code>: a limit for each second and the month&apos;s quota. Over either, the answer is 429 with <code>Retry-After</code>. Items of a batch count singly towards the quota.
          </p>
        </section>
        <section>
          <SectionHead>Problems</SectionHead>
          <p>
            What goes wrong comes as <code>application/problem+json</code> (RFC 9457) with a pointer to each field at fault. <Link href="/docs/problems" className="link">Every kind has its page</Link>. A field that is not defined is a fault too, so that a misspelt option is never ignored in silence.
          </p>
        </section>
      </div>
    </>
  );
}
