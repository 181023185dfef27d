import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { PageHeader } from "../../_components/layout/PageHeader";
import { ActionPieces } from "./ActionPieces";
import { DataPieces } from "./DataPieces";
import { FigurePieces } from "./FigurePieces";
import { FormPieces } from "./FormPieces";
import { ShellPieces } from "./ShellPieces";
import { TextPieces } from "./TextPieces";

export const metadata: Metadata = { title: "Pieces", robots: { index: false } };

/** Every piece in both themes, side by side; for those who work on the project, so not in production. */
export default function DesignPage() {
  if (process.env.NODE_ENV === "production") notFound();
  return (
    <>
      <PageHeader
        title="Pieces"
        facts={[
          { label: "Where", value: "app/_components" },
          { label: "Text", value: "Instrument Sans" },
          { label: "Figures", value: "Spline Sans Mono" },
        ]}
      >
        What pages are built from. Each piece says in its own file what it takes.
      </PageHeader>
      <div className="grid gap-8 xl:grid-cols-2">
        {(["light", "dark"] as const).map((theme) => (
          <div key={theme} data-theme={theme} className="grid min-w-0 content-start gap-8 border bg-paper p-4 text-ink">
            <TextPieces theme={theme} />
            <ActionPieces theme={theme} />
            <FormPieces theme={theme} />
            <DataPieces theme={theme} />
            <FigurePieces theme={theme} />
            <ShellPieces />
          </div>
        ))}
      </div>
    </>
  );
}
