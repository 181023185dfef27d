"use client";

import { useEffect, useId, useRef, type ReactNode } from "react";

interface DialogProps {
  open: boolean;
  /** Called when the person leaves it: Escape, or whatever its content offers. */
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** Buttons, the safe one first. */
  actions?: ReactNode;
  /** `alertdialog` where it interrupts to ask. */
  role?: "dialog" | "alertdialog";
}

/**
 * A modal dialog, on the browser's own `dialog` element: it keeps the focus inside, makes the page behind inert,
 * closes with Escape and gives the focus back.
 */
export function Dialog({ open, onClose, title, children, actions, role }: DialogProps) {
  const element = useRef<HTMLDialogElement>(null);
  const id = useId();

  useEffect(() => {
    const dialog = element.current;
    if (!dialog) return;
    if (open && !dialog.open) dialog.showModal();
    if (!open && dialog.open) dialog.close();
  }, [open]);

  return (
    <dialog
      ref={element}
      role={role}
      onClose={onClose}
      aria-labelledby={`${id}-title`}
      aria-describedby={`${id}-body`}
      className="m-auto w-[min(32rem,calc(100vw-2rem))] border-2 border-ink rounded-sheet bg-card p-0 text-ink backdrop:bg-[rgb(12_18_16/0.55)]"
    >
      {open && (
        <>
          <h2 id={`${id}-title`} className="border-b px-5 py-3 text-lead font-semibold">
            {title}
          </h2>
          <div id={`${id}-body`} className="px-5 py-4">
            {children}
          </div>
          {actions && <div className="flex flex-wrap gap-2 border-t px-5 py-3">{actions}</div>}
        </>
      )}
    </dialog>
  );
}
