import type { Metadata } from "next";
import { PageHeader } from "@/app/_components/layout/PageHeader";

export const metadata: Metadata = { title: "Cautions" };

const CAUTIONS = [
  ["Before drilling", "Find wiring, refrigerant lines and coils first. Old insulation or duct wrap may contain asbestos: stop and have it tested."],
  ["Fans", "Lock out and tag out a fan before reaching in."],
  ["The place", "Heat, ladders and confined spaces: follow the site's safety plan."],
  ["The air", "Exhaust from laboratories, kitchens or processes can be toxic, hot or flammable."],
  ["Afterwards", "Every hole is sealed with a plug or a tape listed for the duct material."],
  ["The figures", "Results support, and do not replace, local codes, the project specification and licensed or certified practice. Smoke control and laboratory containment need the responsible professional."],
] as const;

export default function CautionsPage() {
  return (
    <>
      <PageHeader title="Cautions">What a traverse asks of whoever stands on the ladder, and what a figure is not.</PageHeader>
      <dl className="prose grid gap-4">
        {CAUTIONS.map(([term, text]) => (
          <div key={term}>
            <dt className="font-semibold">{term}</dt>
            <dd>{text}</dd>
          </div>
        ))}
      </dl>
    </>
  );
}
