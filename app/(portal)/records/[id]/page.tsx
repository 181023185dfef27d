import type { Metadata } from "next";
import Link from "next/link";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { ChecksList } from "@/app/_components/data/ChecksList";
import { DefinitionList } from "@/app/_components/data/DefinitionList";
import { ResultHead } from "@/app/_components/data/ResultHead";
import { WorkingTable } from "@/app/_components/data/WorkingTable";
import { Figure } from "@/app/_components/figures/Figure";
import { Profile } from "@/app/_components/figures/Profile";
import { UncertaintyBars } from "@/app/_components/figures/UncertaintyBars";
import { Time } from "@/app/_components/format/Time";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { SectionHead } from "@/app/_components/layout/SectionHead";
import { ReadingsAsWritten } from "@/app/_components/records/ReadingsAsWritten";
import { RecordStanding } from "@/app/_components/records/RecordStanding";
import { airWords, ductWords } from "@/app/_components/records/words";
import { found } from "@/app/_found";
import { readingOf } from "@/app/_realm";
import { requireSignedIn } from "@/app/_session";
import { namesOf } from "@/lib/records/actors";
import { listAttachments } from "@/lib/records/attachments/row";
import { historyOf } from "@/lib/records/history";
import { findProject } from "@/lib/records/projects";
import { traverseOf, type Traverse } from "@/lib/records/traverses/answer";
import { figureOf } from "@/lib/records/traverses/figure";
import { findTraverse, type TraverseRow } from "@/lib/records/traverses/row";
import { Attachments } from "./Attachments";
import { History } from "./History";
import { RecordActions } from "./RecordActions";
import { RecordNotices } from "./RecordNotices";

export const metadata: Metadata = { title: "Traverse" };

/** Drawing units across a telephone. */
const NARROW = 360;

export default async function RecordPage({ params }: { params: Promise<{ id: string }> }) {
  const member = await requireSignedIn();
  const { id } = await params;
  const reading = await readingOf(member);
  const row = await found(findTraverse(reading, id));
  const [project, history, attachments] = await Promise.all([findProject(reading, row.project_id), historyOf(reading, id), listAttachments(reading, id)]);
  const names = await namesOf(reading, history);
  const traverse = traverseOf(row, { working: true });
  const { result, status } = traverse;
  const name = [row.system, row.input.location].filter(Boolean).join(", ") || "Traverse";
  const figure = drawn(row);
  const isDeveloper = member.organisation.role !== "viewer";
  return (
    <>
      <PageHeader
        title={name}
        back={{ href: "/records", label: "Traverses" }}
        facts={[{ label: "Status", value: <RecordStanding status={status} /> }, { label: "Revision", value: traverse.revision }, { label: "Project", value: <Link href={`/projects/${project.id}`} className="link">{project.name}</Link> }, { label: "Id", value: id }]}
        actions={status === "draft" ? undefined : <><LinkButton href={`/api/portal/records/${id}/certificate.pdf`}>Certificate (PDF)</LinkButton><LinkButton href={`/verify/${id}`}>Public page</LinkButton></>}
      />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
        <RecordNotices traverse={traverse} />
        {result && <ResultHead result={result} />}
        {figure && <Figure {...figure} />}
        {result && <Result result={result} />}
        <section aria-labelledby="facts">
          <SectionHead id="facts">What was measured</SectionHead>
          <DefinitionList items={factsOf(traverse)} />
        </section>
        {traverse.readings && <ReadingsAsWritten readings={traverse.readings} />}
        <section aria-labelledby="attachments">
          <SectionHead id="attachments">Attachments</SectionHead>
          <Attachments items={attachments} />
        </section>
        <section aria-labelledby="history">
          <SectionHead id="history">Who did what</SectionHead>
          <History entries={history} names={names} />
        </section>
        {isDeveloper && (status === "draft" || status === "issued") && <RecordActions id={id} name={name} status={status} isReady={traverse.missingForIssue.length === 0} />}
      </div>
    </>
  );
}

function Result({ result }: { result: NonNullable<Traverse["result"]> }) {
  return (
    <>
      <section aria-labelledby="profile">
        <SectionHead id="profile">Profile</SectionHead>
        <Profile points={result.points} />
      </section>
      <section aria-labelledby="checks">
        <SectionHead id="checks" measure={`${result.checks.length} checks`}>Checks</SectionHead>
        <ChecksList checks={result.checks} />
      </section>
      <section aria-labelledby="uncertainty">
        <SectionHead id="uncertainty">How sure it is</SectionHead>
        <UncertaintyBars {...result.uncertainty} />
      </section>
      <section aria-labelledby="working">
        <SectionHead id="working" measure={`${result.working?.length ?? 0} steps`}>Working</SectionHead>
        <WorkingTable steps={result.working ?? []} caption="Working, step by step" maxHeight="28rem" />
      </section>
    </>
  );
}

function factsOf({ technician, takenAt, issuedAt, instrument, calibrationWaiver, duct, air, holes, notes, engineVersion }: Traverse) {
  const calibration = instrument?.calibration;
  return [
    { term: "Taken", value: <><Time value={takenAt} absent="not said when" />{technician ? ` by ${technician}` : ""}</> },
    ...(issuedAt ? [{ term: "Issued", value: <Time value={issuedAt} /> }] : []),
    { term: "Instrument", value: instrument ? [instrument.name, instrument.serialNumber].filter(Boolean).join(", ") : "not named" },
    { term: "Calibration", value: calibration ? [`${calibration.calibratedOn}, due ${calibration.dueOn}`, calibration.laboratory, calibration.certificateNumber].filter(Boolean).join(", ") : "none in force on the day" },
    ...(calibrationWaiver ? [{ term: "Without calibration because", value: calibrationWaiver.reason }] : []),
    { term: "Duct", value: duct ? ductWords(duct) : "not described" },
    { term: "Air", value: airWords(air ?? undefined) },
    { term: "Holes", value: holes ? `${holes.count}, ${holes.sealed ? "sealed" : "not sealed"}${holes.method ? `, ${holes.method}` : ""}` : "not said" },
    ...(notes ? [{ term: "Notes", value: <span className="whitespace-pre-line">{notes}</span> }] : []),
    ...(engineVersion ? [{ term: "Engine", value: engineVersion }] : []),
  ];
}

/** The record's drawing; null where there is nothing to draw yet. */
function drawn(row: TraverseRow): { svg: string; narrow: string } | null {
  return row.input.duct && (row.result || row.input.layout) ? { svg: figureOf(row), narrow: figureOf(row, "page", NARROW) } : null;
}
