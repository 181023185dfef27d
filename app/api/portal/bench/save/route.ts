import { z } from "zod";
import { airflow } from "@/api-spec/calculations/airflow";
import { face } from "@/api-spec/calculations/traversePlan";
import { line, projectId } from "@/api-spec/records/common";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalRecordOperation } from "@/lib/http/portalRecordOperation";
import { createTraverse } from "@/lib/records/traverses/drafts";

const body = z.strictObject({ projectId, system: line(120).nullable(), request: airflow.body!, enterFrom: face });

/** Keeps what was tried on the Bench as a draft. The instrument of a record is one of the firm's, so it is named there. */
export const POST = portalRecordOperation({ access: "developer", body, status: 201 }, async (call) => {
  const { request: { instrument: _instrument, working: _working, ...measured }, ...rest } = call.input;
  const { id } = await createTraverse(call, { ...measured, ...rest });
  return { id };
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
