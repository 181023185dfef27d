import { ductArea as definition } from "@/api-spec/calculations/ductArea";
import { ductArea } from "@/lib/airflow/calculations/ductArea";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => ductArea(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
