"use client";

import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { postToPortal } from "@/app/_components/forms/postToPortal";
import { Notice } from "@/app/_components/layout/Notice";

/** Reminds somebody to confirm their address, and sends the link again. */
export function ResendVerification({ email }: { email: string }) {
  const [state, setState] = useState<"idle" | "pending" | "sent" | "failed">("idle");
  const send = async (): Promise<void> => {
    setState("pending");
    await postToPortal("auth/resend-verification").then(() => setState("sent"), () => setState("failed"));
  };
  return (
    <div className="mb-4">
      <Notice kind="caution" title="Confirm your e-mail address">
        <p>Keys can be made once {email} is confirmed. Open the link in the e-mail.</p>
        <p className="mt-2 flex flex-wrap items-center gap-3">
          <Button size="small" pending={state === "pending"} onClick={() => void send()}>
            Send it again
          </Button>
          <span role="status">{state === "sent" ? "Sent." : state === "failed" ? "It could not be sent. Try again." : ""}</span>
        </p>
      </Notice>
    </div>
  );
}
