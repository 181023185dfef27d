"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/app/_components/actions/Button";
import { Table } from "@/app/_components/data/Table";
import { formatCount } from "@/app/_components/format/number";
import { Time } from "@/app/_components/format/Time";
import { postToPortal } from "@/app/_components/forms/postToPortal";
import { Status } from "@/app/_components/layout/Status";
import type { Delivery } from "@/lib/webhooks/deliveries";

const STANDING = { delivered: "good", pending: "information", failed: "failure" } as const;
const WORD = { delivered: "Delivered", pending: "Waiting", failed: "Given up" } as const;

interface DeliveriesTableProps {
  endpointId: string;
  deliveries: Delivery[];
  canRedeliver: boolean;
}

/** What was sent, how often it was tried, and what came back. */
export function DeliveriesTable({ endpointId, deliveries, canRedeliver }: DeliveriesTableProps) {
  const router = useRouter();
  const again = async (deliveryId: string): Promise<void> => {
    await postToPortal(`webhooks/${endpointId}/redeliver`, { deliveryId });
    router.refresh();
  };
  return (
    <Table caption="Deliveries" hideCaption>
      <thead>
        <tr>
          <th scope="col">Event</th>
          <th scope="col">Status</th>
          <th scope="col">Made</th>
          <th scope="col">Attempts</th>
          <th scope="col">Last answer</th>
          <th scope="col"><span className="sr-only">Action</span></th>
        </tr>
      </thead>
      <tbody>
        {deliveries.map((delivery) => (
          <tr key={delivery.id}>
            <th scope="row">
              <span className="block">{delivery.eventType}</span>
              <code className="text-fine text-muted">{delivery.eventId}</code>
            </th>
            <td><Status standing={STANDING[delivery.status]}>{WORD[delivery.status]}</Status></td>
            <td><Time value={delivery.createdAt} style="second" /></td>
            <td>{formatCount(delivery.attempts.length, "attempt")}</td>
            <td>{lastAnswer(delivery)}</td>
            <td>
              {canRedeliver && (
                <Button size="small" onClick={() => void again(delivery.id)} aria-label={`Deliver ${delivery.eventType} again`}>
                  Deliver again
                </Button>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function lastAnswer({ attempts, nextAttemptAt }: Delivery) {
  const last = attempts.at(-1);
  return (
    <>
      {last ? `${last.status ?? last.error ?? "no answer"} in ${last.milliseconds} ms` : "not tried yet"}
      {nextAttemptAt && <span className="block text-fine text-muted">next <Time value={nextAttemptAt} style="second" /></span>}
    </>
  );
}
