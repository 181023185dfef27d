import type { Environment } from "@/lib/keys/keyText";

/** The portal shows one environment at a time; this cookie holds which. */
export const ENVIRONMENT_COOKIE = "averduct_environment";

/** The environment a cookie names; the sandbox, where nothing can go wrong, for anything else. */
export const environmentFrom = (text: string | undefined): Environment => (text === "production" ? "production" : "sandbox");
