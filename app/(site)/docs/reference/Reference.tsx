"use client";

import Link from "next/link";
import { useRef, useState } from "react";
import SwaggerUI from "swagger-ui-react";
import "swagger-ui-react/swagger-ui.css";
import "./reference.css";
import { Button } from "@/app/_components/actions/Button";
import { postToPortal, Refused } from "@/app/_components/forms/postToPortal";
import { Notice } from "@/app/_components/layout/Notice";

/** What the page uses of the object that Swagger UI hands over when it is ready. */
interface SwaggerSystem {
  preauthorizeApiKey(scheme: string, key: string): void;
}

export default function Reference({ canMakeKey }: { canMakeKey: boolean }) {
  const system = useRef<SwaggerSystem | null>(null);
  const [state, setState] = useState<{ kind: "idle" | "pending" | "ready" } | { kind: "failed"; message: string }>({ kind: "idle" });

  const makeSandboxKey = async (): Promise<void> => {
    setState({ kind: "pending" });
    try {
      const { text } = await postToPortal<{ text: string }>("keys/reference");
      system.current?.preauthorizeApiKey("apiKey", text);
      setState({ kind: "ready" });
    } catch (error) {
      setState({ kind: "failed", message: error instanceof Refused ? error.message : "No key could be made. Try again." });
    }
  };

  return (
    <>
      <div className="mb-4 grid gap-3">
        {canMakeKey ? (
          <div className="flex flex-wrap items-center gap-3">
            <Button variant="primary" pending={state.kind === "pending"} onClick={() => void makeSandboxKey()}>
              Use a sandbox key
            </Button>
            <span role="status" className="text-muted">
              {state.kind === "ready" ? "A sandbox key, good for an hour, is in place. Press “Try it out” at any operation." : "Makes a key for this page, good for an hour."}
            </span>
          </div>
        ) : (
          <p className="text-muted">
            <Link href="/sign-in?next=/docs/reference" className="link">
              Sign in
            </Link>{" "}
            to try operations here with a sandbox key.
          </p>
        )}
        {state.kind === "failed" && (
          <Notice kind="failure" live>
            {state.message}
          </Notice>
        )}
      </div>
      <div className="reference">
        <SwaggerUI
          url="/api/v1/openapi.json"
          docExpansion="list"
          defaultModelsExpandDepth={-1}
          displayRequestDuration
          deepLinking
          onComplete={(ready: unknown) => {
            system.current = ready as SwaggerSystem;
          }}
        />
      </div>
    </>
  );
}
