import { traversePlan as definition } from "@/api-spec/calculations/traversePlan";
import { traversePlan } from "@/lib/airflow/calculations/traversePlan";
import { planFigure } from "@/lib/airflow/figure/planFigure";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => traversePlan(input), planFigure);
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
