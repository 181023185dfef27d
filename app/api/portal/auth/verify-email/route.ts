import { z } from "zod";
import { verifyEmail } from "@/lib/accounts/verifyEmail";
import { sessionCookie } from "@/lib/http/cookies";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const body = z.strictObject({ token: z.string().max(100) });

export const POST = portalOperation({ access: "anyone", body }, async ({ input, caller, userAgent }) => ({
  cookie: sessionCookie(await verifyEmail(input.token, { userAgent, formerSessionId: caller?.sessionId })),
}));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
