import { BarChart } from "../../_components/data/BarChart";
import { DataTable } from "../../_components/data/DataTable";
import { DefinitionList } from "../../_components/data/DefinitionList";
import { Pagination } from "../../_components/data/Pagination";
import { Sparkline } from "../../_components/data/Sparkline";
import { Stat } from "../../_components/data/Stat";
import { StatRow } from "../../_components/data/StatRow";
import { Time } from "../../_components/format/Time";
import { Status } from "../../_components/layout/Status";
import { Piece } from "./Piece";

/** Invented counts with a weekly rhythm. */
const DAYS = Array.from({ length: 30 }, (_, day) => {
  const busy = day % 7 < 5 ? 1 : 0.25;
  return {
    label: `2026-11-${String(day + 1).padStart(2, "0")}`,
    values: [Math.round((1200 + 37 * day) * busy), Math.round((420 + 90 * Math.sin(day)) * busy), Math.round(160 * busy)],
  };
});

export function DataPieces({ theme }: { theme: string }) {
  return (
    <>
      <Piece name="data/StatRow, data/Stat, data/Sparkline">
        <StatRow>
          <Stat label="Requests this month" value="38,214" note={<Sparkline values={DAYS.map(({ values }) => values[0] ?? 0)} label="Requests a day, November" />} />
          <Stat label="Of the plan" value="76.4" unit="%" share={0.764} note="50,000 a month" />
          <Stat label="Refused" value="0.31" unit="%" note="118 requests" />
        </StatRow>
      </Piece>
      <Piece name="data/DataTable, data/Pagination">
        <DataTable
          caption={`Traverses, ${theme}`}
          filter="Find"
          sortedBy={{ key: "taken", descending: true }}
          columns={[
            { key: "system", header: "System" },
            { key: "airflow", header: "ft³/min", numeric: true },
            { key: "share", header: "Of design", numeric: true },
            { key: "status", header: "Status" },
            { key: "taken", header: "Taken" },
          ]}
          rows={[
            ["AHU-1 supply main", 2533, 97.4, "good", "Issued", "2026-11-30T14:05:00Z"],
            ["AHU-2 return", 1880, 88.7, "caution", "Draft", "2026-11-30T15:40:00Z"],
            ["EF-3", 1012, 101.2, "neutral", "Void", "2026-11-28T09:12:00Z"],
          ].map(([system, airflow, share, standing, word, taken]) => ({
            id: String(system),
            cells: {
              system: String(system),
              airflow: Number(airflow),
              share: { value: Number(share), show: `${share} %` },
              status: { value: String(word), show: <Status standing={standing as "good"}>{word}</Status> },
              taken: { value: String(taken), show: <Time value={String(taken)} /> },
            },
          }))}
        />
        <Pagination label={`Pages, ${theme}`} shown="3 traverses" firstHref="/design" nextHref="/design" />
      </Piece>
      <Piece name="data/BarChart">
        <BarChart title={`Requests a day, ${theme}`} of="Day" unit="requests" series={["airflow", "traverse-plan", "reconciliation"]} bars={DAYS} />
      </Piece>
      <Piece name="data/DefinitionList">
        <DefinitionList
          mono
          items={[
            { term: "Key", value: "key_01kb9x7m2nfe8v3d6q0r5t1w7y" },
            { term: "Created", value: <Time value="2026-12-01T10:32:00Z" /> },
            { term: "Last used", value: <Time value={null} absent="Never" /> },
          ]}
        />
      </Piece>
    </>
  );
}
