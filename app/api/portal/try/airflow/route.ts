import { airflow as definition } from "@/api-spec/calculations/airflow";
import { airflow } from "@/lib/airflow/calculations/airflow";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";
import { spendGuestRequest } from "@/lib/limits/guestLimit";

/** The home page's live calculation: the real operation, for a visitor without a key. */
export const POST = operation({ ...definition, id: "tryAirflow", scope: null }, async ({ input }) => {
  await spendGuestRequest();
  return airflow(input);
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
