import { listSessions } from "@/lib/accounts/listSessions";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

export const GET = portalOperation({ access: "signed_in" }, async ({ caller }) => ({ body: { items: await listSessions(caller) } }));
export const { POST, PUT, PATCH, DELETE } = otherMethods("GET");
