import { Time } from "@/app/_components/format/Time";
import { Status } from "@/app/_components/layout/Status";
import type { WebhookEndpoint } from "@/lib/webhooks/endpoints";

/** Whether an endpoint is told of events, and whether it hears them. */
export function EndpointStanding({ endpoint: { enabled, failingSince } }: { endpoint: WebhookEndpoint }) {
  if (!enabled) return <Status standing="failure">Off</Status>;
  if (failingSince) return <Status standing="caution">Failing since <Time value={failingSince} /></Status>;
  return <Status standing="good">On</Status>;
}
