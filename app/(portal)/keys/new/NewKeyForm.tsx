"use client";

import { useState } from "react";
import { SCOPES } from "@/api-spec/define";
import { Button } from "@/app/_components/actions/Button";
import { Checkbox } from "@/app/_components/forms/Checkbox";
import { FieldError } from "@/app/_components/forms/Field";
import { FormErrors } from "@/app/_components/forms/FormErrors";
import { RadioGroup } from "@/app/_components/forms/RadioGroup";
import { Select } from "@/app/_components/forms/Select";
import { TextArea } from "@/app/_components/forms/TextArea";
import { TextInput } from "@/app/_components/forms/TextInput";
import { usePortalForm } from "@/app/_components/forms/usePortalForm";
import { NewKey } from "../NewKey";

const EXPIRY = [
  { value: "", label: "Never" },
  { value: "30", label: "In 30 days" },
  { value: "90", label: "In 90 days" },
  { value: "365", label: "In a year" },
];

function bodyOf(fields: FormData): unknown {
  const networks = String(fields.get("allowedNetworks")).split(/\s+/).filter(Boolean);
  const days = String(fields.get("expiresInDays"));
  return {
    name: fields.get("name"),
    environment: fields.get("environment"),
    scopes: fields.getAll("scopes"),
    expiresInDays: days ? Number(days) : null,
    allowedNetworks: networks.length > 0 ? networks : null,
  };
}

export function NewKeyForm({ baseUrl }: { baseUrl: string }) {
  const [made, setMade] = useState<{ id: string; text: string } | null>(null);
  const form = usePortalForm<{ id: string; text: string }>("keys", bodyOf, setMade);
  if (made) return <NewKey text={made.text} baseUrl={baseUrl} />;
  const scopesError = form.errorOf("scopes");
  return (
    <form onSubmit={form.submit} noValidate className="grid max-w-2xl gap-5">
      <FormErrors errors={form.errors} title="The key was not made" />
      <TextInput name="name" label="Name" hint="Which program uses it, and where." maxLength={80} required error={form.errorOf("name")} />
      <RadioGroup
        name="environment"
        label="Environment"
        defaultValue="sandbox"
        error={form.errorOf("environment")}
        choices={[
          { value: "sandbox", label: "Sandbox", hint: "For trying and for tests. Its records never mix with production's." },
          { value: "production", label: "Production", hint: "For real work." },
        ]}
      />
      <fieldset id="scopes" className="grid gap-2">
        <legend className="mb-1.5 font-medium">Scopes</legend>
        {Object.entries(SCOPES).map(([scope, meaning]) => (
          <Checkbox key={scope} name="scopes" value={scope} label={<span className="font-mono text-small">{scope}</span>} hint={meaning} defaultChecked={scope === "calculations"} />
        ))}
        {scopesError && <FieldError id="scopes-error">{scopesError}</FieldError>}
      </fieldset>
      <Select name="expiresInDays" label="Expires" choices={EXPIRY} error={form.errorOf("expiresInDays")} />
      <TextArea name="allowedNetworks" label="Allowed networks (optional)" hint="One a line in CIDR form, such as 203.0.113.0/24. Empty: from everywhere." mono rows={3} error={form.errorOf("allowedNetworks")} />
      <div>
        <Button type="submit" variant="primary" pending={form.pending}>
          Make the key
        </Button>
      </div>
    </form>
  );
}
