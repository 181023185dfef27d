"use client";

import { useState } from "react";
import { Button } from "../../_components/actions/Button";
import { ConfirmButton } from "../../_components/actions/ConfirmButton";
import { CopyButton } from "../../_components/actions/CopyButton";
import { Dialog } from "../../_components/actions/Dialog";
import { LinkButton } from "../../_components/actions/LinkButton";
import { Menu } from "../../_components/actions/Menu";
import { CodeBlock } from "../../_components/code/CodeBlock";
import { requestSamples } from "../../_components/code/requestSamples";
import { Secret } from "../../_components/code/Secret";
import { LoadMore } from "../../_components/data/LoadMore";
import { Tabs } from "../../_components/layout/Tabs";
import { Piece } from "./Piece";

const wait = () => new Promise<void>((resolve) => setTimeout(resolve, 800));
const SAMPLES = requestSamples({
  method: "POST",
  url: "https://averduct.example/api/v1/calculations/duct-area",
  body: { duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } } },
});

export function ActionPieces({ theme }: { theme: string }) {
  const [open, setOpen] = useState(false);
  const [shown, setShown] = useState(50);
  return (
    <>
      <Piece name="actions/Button, LinkButton, CopyButton, Menu">
        <div className="flex flex-wrap items-center gap-2">
          <Button variant="primary">Create a key</Button>
          <Button>Rename</Button>
          <Button variant="danger">Delete</Button>
          <Button variant="primary" pending>
            Creating
          </Button>
          <Button disabled>Save</Button>
          <LinkButton href="/design">Open</LinkButton>
          <Button size="small">Small</Button>
          <CopyButton text="averduct" what="the name" />
          <Menu
            label="Actions"
            name={`Actions for the key Field app, ${theme}`}
            items={[
              { label: "Rotate", onSelect: () => setOpen(true) },
              { label: "Requests", href: "/design" },
              { label: "Revoke", onSelect: () => setOpen(true), danger: true },
            ]}
          />
        </div>
      </Piece>
      <Piece name="actions/Dialog, actions/ConfirmButton">
        <div className="flex flex-wrap gap-2">
          <Button onClick={() => setOpen(true)}>Open a dialog</Button>
          <ConfirmButton
            label="Revoke"
            title="Revoke the key Field app?"
            consequence="Requests with it are refused within 5 s. This cannot be undone."
            confirmLabel="Revoke the key"
            onConfirm={wait}
          />
          <ConfirmButton
            label="Delete (fails)"
            title="Delete the project Marram Point Library?"
            consequence="It is removed with its settings."
            confirmLabel="Delete the project"
            onConfirm={() => wait().then(() => Promise.reject(new Error("The project still holds 3 traverses. Move or delete them first.")))}
          />
        </div>
        <Dialog open={open} onClose={() => setOpen(false)} title="Rotate the key" actions={<Button onClick={() => setOpen(false)}>Close</Button>}>
          Both keys work until the overlap ends.
        </Dialog>
      </Piece>
      <Piece name="data/LoadMore">
        <LoadMore shown={shown} noun="request" more={shown < 150} pending={false} onMore={() => setShown(shown + 50)} />
      </Piece>
      <Piece name="layout/Tabs">
        <Tabs
          label={`Views, ${theme}`}
          tabs={[
            { id: "readings", label: "Readings", content: "25 readings in 5 holes." },
            { id: "working", label: "Working", content: "Six steps." },
            { id: "history", label: "History", content: "Two changes." },
          ]}
        />
      </Piece>
      <Piece name="code/CodeBlock, code/Secret">
        <CodeBlock title={`Request, ${theme}`} samples={SAMPLES} />
        <div className="mt-4">
          <Secret label="Key" value="averduct_sandbox_01kb9x7m2n_q3r8v5t1w6y4z0p9s7d2f5g8h1j4k6l3">
            Keep it where the application keeps its secrets.
          </Secret>
        </div>
      </Piece>
    </>
  );
}
