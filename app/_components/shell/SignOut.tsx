"use client";

import { useState } from "react";
import { Button } from "../actions/Button";
import { postToPortal } from "../forms/postToPortal";

/** Ends the session and goes home. */
export function SignOut() {
  const [pending, setPending] = useState(false);
  const signOut = async (): Promise<void> => {
    setPending(true);
    await postToPortal("auth/sign-out").catch(() => undefined);
    window.location.assign("/");
  };
  return (
    <Button size="small" pending={pending} onClick={() => void signOut()}>
      Sign out
    </Button>
  );
}
