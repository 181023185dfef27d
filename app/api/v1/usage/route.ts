import { readUsage as definition } from "@/api-spec/records/usage";
import { operation } from "@/lib/http/operation";
import { otherMethods } from "@/lib/http/otherMethods";
import { usageByDayAndKey } from "@/lib/usage/usageByDayAndKey";

export const GET = operation(definition, async ({ query, key }) => ({ items: await usageByDayAndKey({ organisationId: key!.organisationId, ...query }) }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
