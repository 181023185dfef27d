import type { Metadata } from "next";
import { PageHeader } from "@/app/_components/layout/PageHeader";
import { SectionHead } from "@/app/_components/layout/SectionHead";

export const metadata: Metadata = { title: "Changelog" };

export default function ChangelogPage() {
  return (
    <>
      <PageHeader title="Changelog">What changed for those who call the API. Within version 1 nothing that exists is taken away without notice.</PageHeader>
      <div className="prose">
        <SectionHead>1 December 2026, version 1.0.0</SectionHead>
        <ul>
          <li>Calculations: duct area, traverse plan, air density, density correction, average velocity, airflow, reconciliation, fan adjustment, system balance, and batches of them.</li>
          <li>Keys with scopes, environments, expiry, networks, rotation and revocation.</li>
          <li>Usage by day, operation and status, in the portal and as an operation.</li>
          <li>Plans and airflows as drawings.</li>
          <li>Records: projects, instruments with calibrations, traverses from draft to issued to superseded or void, attachments, history, figures, certificates, signatures and their verification.</li>
          <li>Events and webhooks.</li>
        </ul>
      </div>
    </>
  );
}
