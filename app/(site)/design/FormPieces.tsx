import { Button } from "../../_components/actions/Button";
import { Checkbox } from "../../_components/forms/Checkbox";
import { FormErrors } from "../../_components/forms/FormErrors";
import { RadioGroup } from "../../_components/forms/RadioGroup";
import { Select } from "../../_components/forms/Select";
import { TextArea } from "../../_components/forms/TextArea";
import { TextInput } from "../../_components/forms/TextInput";
import { Piece } from "./Piece";

export function FormPieces({ theme }: { theme: string }) {
  const own = (name: string) => `${theme}-${name}`;
  return (
    <Piece name="forms/FormErrors, TextInput, Select, TextArea, Checkbox, RadioGroup">
      <form className="grid gap-4">
        <FormErrors errors={[{ field: own("email"), message: "Write an e-mail address with an @ in it." }, { message: "The organisation has no seats left." }]} />
        <TextInput id={own("name")} name="name" label="Name of the key" hint="Shown in the list and in the audit log." defaultValue="Field app" />
        <TextInput id={own("email")} name="email" type="email" label="E-mail" defaultValue="r.okonjo" error="Write an e-mail address with an @ in it." />
        <TextInput id={own("width")} name="width" label="Inside width" unit="in" inputMode="decimal" mono defaultValue="24" />
        <Select
          id={own("environment")}
          name="environment"
          label="Environment"
          defaultValue="sandbox"
          choices={[
            { value: "sandbox", label: "Sandbox" },
            { value: "production", label: "Production" },
          ]}
        />
        <TextArea id={own("networks")} name="networks" label="Allowed networks" hint="One CIDR a line. Empty: any." mono placeholder="192.0.2.0/24" />
        <RadioGroup
          id={own("measured")}
          name={own("measured")}
          label="Dimensions"
          defaultValue="inside"
          choices={[
            { value: "inside", label: "Inside", hint: "Clear air space, lining taken off." },
            { value: "outside", label: "Outside", hint: "Needs the wall and the lining." },
          ]}
        />
        <Checkbox id={own("sealed")} name="sealed" label="Every hole is sealed" hint="With a plug or a tape listed for the duct's material." error="Seal the holes before the record is issued." />
        <div className="flex gap-2">
          <Button variant="primary">Create a key</Button>
          <Button>Cancel</Button>
        </div>
      </form>
    </Piece>
  );
}
