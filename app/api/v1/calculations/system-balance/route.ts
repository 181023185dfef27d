import { systemBalance as definition } from "@/api-spec/calculations/systemBalance";
import { systemBalance } from "@/lib/airflow/calculations/systemBalance";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => systemBalance(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
