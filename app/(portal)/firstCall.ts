import type { Sample } from "@/app/_components/code/CodeBlock";
import { requestSamples } from "@/app/_components/code/requestSamples";
import { EXHAUST_DUCT, EXHAUST_READINGS } from "@/api-spec/calculations/examples";

/** The first call that a newcomer pastes; with a key's text in it where there is one to show. */
export const firstCallSamples = (baseUrl: string, key?: string): Sample[] =>
  requestSamples({
    method: "POST",
    url: `${baseUrl}/api/v1/calculations/airflow`,
    body: { duct: EXHAUST_DUCT, readings: EXHAUST_READINGS, instrument: { principle: "rotating_vane" }, units: "ip" },
    key,
  });
