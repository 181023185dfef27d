"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/app/_components/actions/Button";
import { ConfirmButton } from "@/app/_components/actions/ConfirmButton";
import { Secret } from "@/app/_components/code/Secret";
import { postToPortal } from "@/app/_components/forms/postToPortal";

/** What can be done with an endpoint: turn it off or on, give it another secret, delete it. */
export function EndpointActions({ id, enabled, url }: { id: string; enabled: boolean; url: string }) {
  const router = useRouter();
  const [secret, setSecret] = useState<string | null>(null);
  const turn = async (): Promise<void> => {
    await postToPortal(`webhooks/${id}/change`, { enabled: !enabled });
    router.refresh();
  };
  return (
    <div className="grid gap-4">
      {secret && (
        <div role="status">
          <Secret label="Signing secret" value={secret}>Deliveries are signed with the old one as well for a day, so that you can change over.</Secret>
        </div>
      )}
      <div className="flex flex-wrap gap-2">
        <Button onClick={() => void turn()}>{enabled ? "Turn off" : "Turn on"}</Button>
        <ConfirmButton
          variant="plain"
          label="New secret"
          title="Make a new signing secret?"
          consequence="Deliveries are signed with both for a day; after that the old one no longer fits."
          confirmLabel="Make a new secret"
          onConfirm={async () => setSecret((await postToPortal<{ secret: string }>(`webhooks/${id}/secret`)).secret)}
        />
        <ConfirmButton
          label="Delete"
          title="Delete this endpoint?"
          consequence={<>{url} is told of nothing any more, and the log of its deliveries goes too. This cannot be undone.</>}
          confirmLabel="Delete the endpoint"
          onConfirm={async () => {
            await postToPortal(`webhooks/${id}/delete`);
            router.push("/webhooks");
            router.refresh();
          }}
        />
      </div>
    </div>
  );
}
