"use client";

import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { LinkButton } from "@/app/_components/actions/LinkButton";
import { Secret } from "@/app/_components/code/Secret";
import { Checkbox } from "@/app/_components/forms/Checkbox";
import { FieldError } from "@/app/_components/forms/Field";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";

const TYPES = [
  { value: "traverse.issued", meaning: "A traverse was issued, or a revision of one." },
  { value: "traverse.voided", meaning: "A record was withdrawn." },
  { value: "instrument.calibration_due", meaning: "An instrument's calibration is due within 14 days, or has lapsed." },
  { value: "quota.reached", meaning: "The month's requests are used up." },
];

const bodyOf = (fields: FormData): unknown => ({
  url: fields.get("url"),
  eventTypes: fields.getAll("eventTypes"),
  description: String(fields.get("description")).trim() || null,
});

export function NewEndpointForm() {
  const [made, setMade] = useState<{ id: string; secret: string } | null>(null);
  const form = usePortalForm<{ id: string; secret: string }>("webhooks", bodyOf, setMade);
  if (made) {
    return (
      <div className="grid max-w-3xl gap-5" role="status">
        <Secret label="Signing secret" value={made.secret}>
          Your program checks the signature of each delivery with it, as the Standard Webhooks specification has it.
        </Secret>
        <div>
          <LinkButton href={`/webhooks/${made.id}`}>To the endpoint</LinkButton>
        </div>
      </div>
    );
  }
  const typesError = form.errorOf("eventTypes");
  return (
    <form onSubmit={form.submit} noValidate className="grid max-w-2xl gap-5">
      <FormErrors errors={form.errors} title="The endpoint was not made" />
      <TextInput name="url" label="Address" hint="With https, reachable from the internet." type="url" mono required maxLength={500} error={form.errorOf("url")} />
      <TextInput name="description" label="What it is for (optional)" maxLength={200} error={form.errorOf("description")} />
      <fieldset id="eventTypes" className="grid gap-2">
        <legend className="mb-1.5 font-medium">Told of</legend>
        {TYPES.map(({ value, meaning }) => (
          <Checkbox key={value} name="eventTypes" value={value} label={<span className="font-mono text-small">{value}</span>} hint={meaning} defaultChecked={value.startsWith("traverse")} />
        ))}
        {typesError && <FieldError id="eventTypes-error">{typesError}</FieldError>}
      </fieldset>
      <div>
        <Button type="submit" variant="primary" pending={form.pending}>
          Make the endpoint
        </Button>
      </div>
    </form>
  );
}
