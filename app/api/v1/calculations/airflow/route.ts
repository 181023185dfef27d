import { airflow as definition } from "@/api-spec/calculations/airflow";
import { airflow } from "@/lib/airflow/calculations/airflow";
import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";

export const POST = operation(definition, ({ input }) => airflow(input), (input, result) => resultFigure({ ...input, result }));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
