"use client";

import { LinkButton } from "@/app/_components/actions/LinkButton";
import { CodeBlock } from "@/app/_components/code/CodeBlock";
import { Secret } from "@/app/_components/code/Secret";
import { Card } from "@/app/_components/layout/Card";
import { firstCallSamples } from "../firstCall";

/** A key at the one moment it can be read, with a first call that has it in. */
export function NewKey({ text, baseUrl }: { text: string; baseUrl: string }) {
  return (
    <div className="grid max-w-3xl gap-5" role="status">
      <Secret label="Key" value={text}>
        Keep it where your program reads its secrets, never in its source.
      </Secret>
      <Card title="A first call with this key">
        <CodeBlock title="Request" hideTitle samples={firstCallSamples(baseUrl, text)} />
      </Card>
      <div className="flex flex-wrap gap-3">
        <LinkButton href="/keys">To the keys</LinkButton>
        <LinkButton href="/usage">See the usage</LinkButton>
      </div>
    </div>
  );
}
