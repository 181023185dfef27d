import { fanAdjustment as definition } from "@/api-spec/calculations/fanAdjustment";
import { fanAdjustment } from "@/lib/airflow/calculations/fanAdjustment";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => fanAdjustment(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
