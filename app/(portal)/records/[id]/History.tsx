import { Table } from "@/app/_components/data/Table";
import { Time } from "@/app/_components/format/Time";
import type { HistoryAction, historyOf } from "@/lib/records/history";

const WORDS: Record<HistoryAction, string> = {
  created: "Made", changed: "Changed", issued: "Issued", voided: "Voided", superseded: "Superseded", revision_begun: "Revision begun",
  attachment_added: "Attachment added", attachment_changed: "Attachment changed", attachment_deleted: "Attachment deleted",
};

interface HistoryProps {
  entries: Awaited<ReturnType<typeof historyOf>>;
  names: Map<string, string>;
}

/** Who did what to the record, the first first. */
export function History({ entries, names }: HistoryProps) {
  return (
    <Table caption="History" hideCaption>
      <thead>
        <tr>
          <th scope="col">When</th>
          <th scope="col">What</th>
          <th scope="col">Who</th>
          <th scope="col">Particulars</th>
        </tr>
      </thead>
      <tbody>
        {entries.map(({ id, action, at, apiKeyId, userId, details }) => (
          <tr key={id}>
            <td><Time value={at} style="second" /></td>
            <th scope="row">{WORDS[action]}</th>
            <td>{names.get(userId ?? apiKeyId ?? "") ?? "–"}</td>
            <td className="text-small">{details ? Object.entries(details).map(([name, value]) => `${name}: ${Array.isArray(value) ? value.join(", ") : String(value)}`).join("; ") : ""}</td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
