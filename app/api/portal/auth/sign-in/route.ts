import { z } from "zod";
import { emailAddress } from "@/lib/accounts/fields";
import { signIn } from "@/lib/accounts/signIn";
import { sessionCookie } from "@/lib/http/cookies";
import { otherMethods } from "@/lib/http/otherMethods";
import { portalOperation } from "@/lib/http/portalOperation";

const body = z.strictObject({ email: emailAddress, password: z.string().max(200) });

export const POST = portalOperation({ access: "anyone", body }, async ({ input, caller, userAgent }) => ({
  cookie: sessionCookie(await signIn(input, { userAgent, formerSessionId: caller?.sessionId })),
}));
export const { GET, PUT, PATCH, DELETE } = otherMethods("POST");
