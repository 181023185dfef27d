"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";

const text = (fields: FormData, name: string): string | null => String(fields.get(name)).trim() || null;

const bodyOf = (fields: FormData): unknown => ({
  calibratedOn: String(fields.get("calibratedOn")), dueOn: String(fields.get("dueOn")), laboratory: text(fields, "laboratory"), certificateNumber: text(fields, "certificateNumber"),
  ...(text(fields, "gain") !== null && { gain: Number(text(fields, "gain")) }),
});

/** Adds a calibration to an instrument. */
export function CalibrationForm({ instrumentId }: { instrumentId: string }) {
  const router = useRouter();
  const [added, setAdded] = useState(0);
  const form = usePortalForm(`instruments/${instrumentId}/calibrations`, bodyOf, () => {
    setAdded(added + 1);
    router.refresh();
  });
  return (
    <form key={added} onSubmit={form.submit} noValidate className="grid max-w-2xl gap-4">
      <FormErrors errors={form.errors} title="The calibration was not added" />
      <div className="grid gap-4 sm:grid-cols-2">
        <TextInput name="calibratedOn" label="Calibrated on" type="date" required error={form.errorOf("calibratedOn")} />
        <TextInput name="dueOn" label="Due on" type="date" required error={form.errorOf("dueOn")} />
        <TextInput name="laboratory" label="Laboratory (optional)" maxLength={160} error={form.errorOf("laboratory")} />
        <TextInput name="certificateNumber" label="Certificate number (optional)" maxLength={120} error={form.errorOf("certificateNumber")} />
        <TextInput name="gain" label="Gain (optional)" hint="A reading counts as gain × reading; 1 when left out." inputMode="decimal" error={form.errorOf("gain")} />
      </div>
      <div>
        <Button type="submit" pending={form.pending}>
          Add the calibration
        </Button>
      </div>
    </form>
  );
}
