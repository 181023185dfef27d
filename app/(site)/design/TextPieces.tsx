import { Badge } from "../../_components/layout/Badge";
import { Card } from "../../_components/layout/Card";
import { Notice } from "../../_components/layout/Notice";
import { SectionHead } from "../../_components/layout/SectionHead";
import { Status } from "../../_components/layout/Status";
import { EmptyState } from "../../_components/mark/EmptyState";
import { Loading } from "../../_components/mark/Loading";
import { Mark } from "../../_components/mark/Mark";
import { LinkButton } from "../../_components/actions/LinkButton";
import { Piece } from "./Piece";

const COLOURS = ["bg-paper", "bg-card", "bg-inset", "bg-ink", "bg-muted", "bg-edge", "bg-rule", "bg-action", "bg-action-wash", "bg-rust", "bg-rust-wash", "bg-ochre", "bg-ochre-wash"];
const SIZES = ["text-fine", "text-small", "text-base", "text-lead", "text-title", "text-head", "text-figure"];

export function TextPieces({ theme }: { theme: string }) {
  return (
    <>
      <SectionHead measure={`${COLOURS.length} colours`}>Theme: {theme}</SectionHead>
      <ul className="grid grid-cols-[repeat(auto-fill,minmax(7rem,1fr))] gap-2 font-mono text-fine">
        {COLOURS.map((colour) => (
          <li key={colour} className="border bg-card">
            <span aria-hidden className={`block h-7 border-b ${colour}`} />
            <span className="block px-1.5 py-0.5">{colour.slice(3)}</span>
          </li>
        ))}
      </ul>
      <div>
        {SIZES.map((size) => (
          <p key={size} className={size}>
            {size.slice(5)} <span className="font-mono">2,533 ft³/min ± 74</span>
          </p>
        ))}
      </div>
      <Piece name="mark/Mark">
        <div className="flex items-end gap-4 text-action">
          <Mark size={16} />
          <Mark size={24} />
          <Mark size={48} title="Averduct" />
          <Mark size={48} state="empty" />
          <Mark size={48} state="reading" />
        </div>
      </Piece>
      <Piece name="mark/EmptyState, mark/Loading">
        <EmptyState title="No keys yet" action={<LinkButton href="/design">Create a key</LinkButton>}>
          A key lets an application call the API. Start with one for the sandbox.
        </EmptyState>
        <Loading label="Reading the usage" />
      </Piece>
      <Piece name="layout/Notice">
        <div className="grid gap-2">
          <Notice>Records made with a sandbox key never appear in production.</Notice>
          <Notice kind="good">The key was revoked. It stops working everywhere within 5 s.</Notice>
          <Notice kind="caution">The instrument&apos;s calibration ends on 14 Dec 2026.</Notice>
          <Notice kind="failure">The sheet was not saved: the connection broke. Try again.</Notice>
        </div>
      </Piece>
      <Piece name="layout/Badge, layout/Status">
        <div className="flex flex-wrap items-center gap-3 text-small">
          <Badge>sandbox</Badge>
          <Badge>records:read</Badge>
          <Status standing="good">Active</Status>
          <Status standing="caution">Undecided</Status>
          <Status standing="failure">Suspended</Status>
          <Status standing="information">Draft</Status>
          <Status standing="neutral">Void</Status>
        </div>
      </Piece>
      <Piece name="layout/Card">
        <Card title="Plan" aside="renewed monthly" foot={<span className="text-small text-muted">Renews on 1 Jan 2027</span>}>
          10,000 requests a month, 10 a second.
        </Card>
      </Piece>
    </>
  );
}
