import { z } from "zod";
import { PASSWORD_NOT_ACCEPTED, passwordFault } from "./password";

/** Fields that several of the portal's forms have. */

export const emailAddress = z.string().trim().toLowerCase().pipe(z.email("This is not an e-mail address.").max(254));

// Control characters would break e-mail headers and log lines.
export const personName = z
  .string()
  .trim()
  .regex(/./u, "This must not be empty.")
  .max(120)
  .regex(/^\P{Cc}*$/u, "Control characters are not taken here.");

export const newPassword = z.string().superRefine((password, context) => {
  const message = passwordFault(password);
  if (message) context.addIssue({ code: "custom", message, params: { code: PASSWORD_NOT_ACCEPTED } });
});
