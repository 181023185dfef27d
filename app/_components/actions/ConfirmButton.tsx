"use client";

import { useState, type ReactNode } from "react";
import { Notice } from "../layout/Notice";
import { Button } from "./Button";
import type { ButtonSize, ButtonVariant } from "./buttonStyle";
import { Dialog } from "./Dialog";

interface ConfirmButtonProps {
  /** What the button says: "Revoke". */
  label: ReactNode;
  /** The question, naming the thing: "Revoke the key Field app?". */
  title: string;
  /** What will happen and whether it can be undone. */
  consequence: ReactNode;
  /** What the confirming button says; the verb again: "Revoke the key". */
  confirmLabel: string;
  /** Does it. Resolve when done; reject with an Error whose message is fit to be read. */
  onConfirm: () => Promise<void> | void;
  variant?: ButtonVariant;
  size?: ButtonSize;
  disabled?: boolean;
}

/** A button for what destroys or cannot be undone: it asks first, and stays to say so when it failed. */
export function ConfirmButton({ label, title, consequence, confirmLabel, onConfirm, variant = "danger", size, disabled }: ConfirmButtonProps) {
  const [open, setOpen] = useState(false);
  const [pending, setPending] = useState(false);
  const [failure, setFailure] = useState<string | null>(null);

  const confirm = async () => {
    setPending(true);
    setFailure(null);
    try {
      await onConfirm();
      setOpen(false);
    } catch (error) {
      setFailure(error instanceof Error ? error.message : "It could not be done. Try again.");
    } finally {
      setPending(false);
    }
  };

  return (
    <>
      <Button variant={variant} size={size} disabled={disabled} onClick={() => setOpen(true)} aria-haspopup="dialog">
        {label}
      </Button>
      <Dialog
        open={open}
        onClose={() => {
          setOpen(false);
          setFailure(null);
        }}
        title={title}
        role="alertdialog"
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Cancel</Button>
            <Button variant={variant} pending={pending} onClick={confirm}>
              {confirmLabel}
            </Button>
          </>
        }
      >
        <div>{consequence}</div>
        {failure && (
          <div className="mt-3">
            <Notice kind="failure" live>
              {failure}
            </Notice>
          </div>
        )}
      </Dialog>
    </>
  );
}
