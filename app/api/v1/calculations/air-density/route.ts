import { airDensity as definition } from "@/api-spec/calculations/airDensity";
import { airDensity } from "@/lib/airflow/calculations/airDensity";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => airDensity(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
