import { airflow as definition } from "@/api-spec/calculations/airflow";
import { airflow } from "@/lib/airflow/calculations/airflow";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => airflow(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
