import { verify as definition } from "@/api-spec/records/verify";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";
import { spendGuestRequest } from "@/lib/limits/guestLimit";
import { verifySignature } from "@/lib/records/verifySignature";

export const POST = operation(definition, async ({ input }) => {
  await spendGuestRequest();
  return verifySignature(input);
});
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
