"use client";

import { useSyncExternalStore } from "react";
import { CopyButton } from "../actions/CopyButton";
import { Tabs } from "../layout/Tabs";
import { chosenLanguage, chooseLanguage, onLanguageChosen } from "./chosenLanguage";

export interface Sample {
  /** On the tab: "curl", "TypeScript", "Python", "JSON". */
  language: string;
  code: string;
}

interface CodeBlockProps {
  /** What the code is: "Request", "Answer". */
  title: string;
  /** Only read out: where a heading or a tab beside it says it already. */
  hideTitle?: boolean;
  /** One text, or the same thing in several languages on tabs. */
  samples: Sample[];
  /** CSS length above which it scrolls within. */
  maxHeight?: string;
}

/** Code to read and to copy. Where there are several languages, the choice holds for every block and is remembered. */
export function CodeBlock({ title, hideTitle = false, samples, maxHeight = "26rem" }: CodeBlockProps) {
  const chosen = useSyncExternalStore(onLanguageChosen, chosenLanguage, () => null);
  const first = samples[0];
  if (!first) return null;
  const current = samples.find(({ language }) => language === chosen) ?? first;

  if (samples.length === 1) {
    return (
      <figure className="min-w-0">
        <figcaption className="relative flex items-end justify-between gap-3 pb-1.5">
          <span className={hideTitle ? "sr-only" : "text-small font-semibold"}>{title}</span>
          <span className="ml-auto">
            <CopyButton text={first.code} what={title.toLowerCase()} />
          </span>
        </figcaption>
        <Code title={title} code={first.code} maxHeight={maxHeight} />
      </figure>
    );
  }
  return (
    <div className="min-w-0">
      {!hideTitle && <p className="text-small font-semibold">{title}</p>}
      <Tabs
        label={`${title}: language`}
        value={current.language}
        onChange={chooseLanguage}
        aside={<CopyButton text={current.code} what={`${title.toLowerCase()} as ${current.language}`} />}
        tabs={samples.map(({ language, code }) => ({
          id: language,
          label: language,
          content: <Code title={`${title}, ${language}`} code={code} maxHeight={maxHeight} />,
        }))}
      />
    </div>
  );
}

function Code({ title, code, maxHeight }: { title: string; code: string; maxHeight: string }) {
  return (
    <pre
      role="region"
      aria-label={title}
      tabIndex={0}
      style={{ maxHeight }}
      className="overflow-auto border border-l-4 border-l-edge rounded-sheet bg-card px-3.5 py-2.5 font-mono text-small"
    >
      <code className="text-[1em]">{code}</code>
    </pre>
  );
}
