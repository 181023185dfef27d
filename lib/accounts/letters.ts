import type { Mail } from "@/lib/mail/sendMail";
import { config } from "@/lib/runtime/config";

/** The e-mails about an account. */

const at = (path: string): string => new URL(path, config().AVERDUCT_URL).href;

export const confirmAddress = (to: string, token: string): Mail => ({
  to,
  subject: "Confirm your e-mail address",
  text: `Open this page and press Confirm. The link is good for three days, once.\n\n${at(`/verify-email?token=${token}`)}\n\nIf you did not open an account with Averduct, do nothing.`,
});

export const alreadyKnown = (to: string): Mail => ({
  to,
  subject: "You have an account already",
  text: `Somebody, perhaps you, tried to open an account with this address. It has one already.\n\nSign in: ${at("/sign-in")}\nForgotten the password: ${at("/forgot-password")}\n\nIf it was not you, do nothing.`,
});

export const resetLink = (to: string, token: string): Mail => ({
  to,
  subject: "Set a new password",
  text: `Open this page and choose a new password. The link is good for one hour, once.\n\n${at(`/reset-password?token=${token}`)}\n\nIf you did not ask for it, do nothing; your password stays as it is.`,
});

export const passwordChanged = (to: string): Mail => ({
  to,
  subject: "Your password was changed",
  text: `The password of your Averduct account was changed, and its other sessions were ended.\n\nIf it was not you, set a new one now: ${at("/forgot-password")}`,
});
