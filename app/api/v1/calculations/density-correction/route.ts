import { densityCorrection as definition } from "@/api-spec/calculations/densityCorrection";
import { densityCorrection } from "@/lib/airflow/calculations/densityCorrection";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => densityCorrection(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
