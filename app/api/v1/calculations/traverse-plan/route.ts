import { traversePlan as definition } from "@/api-spec/calculations/traversePlan";
import { traversePlan } from "@/lib/airflow/calculations/traversePlan";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => traversePlan(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
