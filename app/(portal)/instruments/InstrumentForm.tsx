"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { Select } from "@/app/_components/forms/Select";
import { TextArea } from "@/app/_components/forms/TextArea";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { Notice } from "@/app/_components/layout/Notice";
import type { StoredInstrument } from "@/lib/records/instruments";
import { PRINCIPLES } from "./principles";

const text = (fields: FormData, name: string): string | null => String(fields.get(name)).trim() || null;

function bodyOf(fields: FormData, before?: StoredInstrument): unknown {
  const accuracy = text(fields, "accuracy");
  return {
    name: String(fields.get("name")), manufacturer: text(fields, "manufacturer"), model: text(fields, "model"), serialNumber: text(fields, "serialNumber"),
    principle: fields.get("principle"), notes: text(fields, "notes"),
    ...(accuracy !== null && { accuracy: { ...before?.accuracy, percentOfReading: Number(accuracy) } }),
  };
}

/** Adds an instrument, or changes one. */
export function InstrumentForm({ instrument }: { instrument?: StoredInstrument }) {
  const router = useRouter();
  const [changed, setChanged] = useState(false);
  const form = usePortalForm<{ id: string }>(instrument ? `instruments/${instrument.id}/change` : "instruments", (fields) => bodyOf(fields, instrument), ({ id }) => {
    if (!instrument) router.push(`/instruments/${id}`);
    setChanged(instrument !== undefined);
    router.refresh();
  });
  return (
    <form onSubmit={form.submit} noValidate className="grid max-w-2xl gap-4">
      <FormErrors errors={form.errors} title={instrument ? "The instrument was not changed" : "The instrument was not added"} />
      {changed && form.errors.length === 0 && <Notice kind="good" title="Changed" live>What was issued keeps the instrument as it was on the day.</Notice>}
      <div className="grid gap-4 sm:grid-cols-2">
        <TextInput name="name" label="Name" hint="What the firm calls it." required maxLength={160} defaultValue={instrument?.name} error={form.errorOf("name")} />
        <TextInput name="serialNumber" label="Serial number (optional)" hint="As on its plate." maxLength={120} defaultValue={instrument?.serialNumber ?? ""} error={form.errorOf("serialNumber")} />
        <Select name="principle" label="Principle" choices={Object.entries(PRINCIPLES).map(([value, label]) => ({ value, label }))} defaultValue={instrument?.principle} error={form.errorOf("principle")} />
        <TextInput name="accuracy" label="Accuracy (optional)" unit="% of reading" inputMode="decimal" defaultValue={instrument?.accuracy?.percentOfReading ?? ""} error={form.errorOf("accuracy")} />
        <TextInput name="manufacturer" label="Manufacturer (optional)" maxLength={120} defaultValue={instrument?.manufacturer ?? ""} error={form.errorOf("manufacturer")} />
        <TextInput name="model" label="Model (optional)" maxLength={120} defaultValue={instrument?.model ?? ""} error={form.errorOf("model")} />
      </div>
      <TextArea name="notes" label="Notes (optional)" rows={2} maxLength={4000} defaultValue={instrument?.notes ?? ""} error={form.errorOf("notes")} />
      <div>
        <Button type="submit" variant="primary" pending={form.pending}>
          {instrument ? "Change the instrument" : "Add the instrument"}
        </Button>
      </div>
    </form>
  );
}
