import { reconciliation as definition } from "@/api-spec/calculations/reconciliation";
import { reconciliation } from "@/lib/airflow/calculations/reconciliation";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => reconciliation(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
