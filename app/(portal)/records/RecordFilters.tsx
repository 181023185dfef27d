import { Button } from "@/app/_components/actions/Button";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { Select, type Choice } from "@/app/_components/forms/Select";
import { TextInput } from "@/app/_components/forms/TextInput";
import type { RecordSearch } from "./filters";

interface RecordFiltersProps {
  search: RecordSearch;
  projects: Choice[];
  instruments: Choice[];
}

const ANY = { value: "", label: "Any" };

/** Narrows the list; everything is in the address, so that a search can be kept and sent. */
export function RecordFilters({ search, projects, instruments }: RecordFiltersProps) {
  return (
    <form action="/records" role="search" aria-label="Narrow the list" className="no-print mb-4 grid grid-cols-2 items-end gap-x-4 gap-y-3 border-b pb-4 sm:grid-cols-3 lg:grid-cols-4">
      <Select name="projectId" label="Project" choices={[ANY, ...projects]} defaultValue={search.projectId ?? ""} />
      <Select name="status" label="Status" choices={[ANY, { value: "draft", label: "Draft" }, { value: "issued", label: "Issued" }, { value: "superseded", label: "Superseded" }, { value: "void", label: "Void" }]} defaultValue={search.status ?? ""} />
      <TextInput name="system" label="System" defaultValue={search.system ?? ""} maxLength={120} />
      <Select name="instrumentId" label="Instrument" choices={[ANY, ...instruments]} defaultValue={search.instrumentId ?? ""} />
      <TextInput name="from" label="Taken from" type="date" defaultValue={search.from ?? ""} />
      <TextInput name="to" label="Taken to" type="date" defaultValue={search.to ?? ""} />
      <Select name="outsideTolerance" label="Design" choices={[ANY, { value: "true", label: "Outside tolerance" }, { value: "false", label: "Within tolerance" }]} defaultValue={search.outsideTolerance ?? ""} />
      <Select name="sort" label="Order" choices={[{ value: "-created", label: "Made, latest first" }, { value: "created", label: "Made, first first" }, { value: "-taken", label: "Taken, latest first" }, { value: "taken", label: "Taken, first first" }]} defaultValue={search.sort ?? "-created"} />
      {search.view && <input type="hidden" name="view" value={search.view} />}
      <div className="flex gap-2">
        <Button type="submit">Show</Button>
        <LinkButton href="/records">All</LinkButton>
      </div>
    </form>
  );
}
