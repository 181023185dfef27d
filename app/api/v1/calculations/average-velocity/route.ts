import { averageVelocity as definition } from "@/api-spec/calculations/averageVelocity";
import { averageVelocity } from "@/lib/airflow/calculations/averageVelocity";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => averageVelocity(input));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
