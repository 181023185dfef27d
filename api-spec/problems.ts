export interface ProblemType {
  status: number;
  title: string;
  /** What happened and what it means. */
  meaning: string;
  /** What the caller can do about it. */
  remedy: string;
}

/** Every problem the API can answer with. The key is the last part of its `type` URL, `/docs/problems/<slug>`. */
export const PROBLEMS = {
  "malformed-json": {
    status: 400,
    title: "The body is not JSON",
    meaning: "The body could not be parsed as JSON, so nothing in it was looked at. NaN, Infinity, comments and trailing commas are not JSON.",
    remedy: "Send UTF-8 JSON as RFC 8259 has it. The detail names where parsing stopped.",
  },
  "missing-key": {
    status: 401,
    title: "No API key was sent",
    meaning: "The operation needs an API key and the request has none.",
    remedy: "Send the header Authorization: Bearer <key>. Keys are made in the portal under Keys.",
  },
  "malformed-key": {
    status: 401,
    title: "This is not a key as issued",
    meaning: "The key's form or its checksum is wrong: a character was lost, added or changed while it was copied.",
    remedy: "Copy the whole key again. A key begins with averduct_sandbox_ or averduct_production_.",
  },
  "unknown-key": {
    status: 401,
    title: "This key does not exist",
    meaning: "The key has the right form but no such key is on record, or its secret does not match.",
    remedy: "Check that the key belongs to this installation, or make a new one in the portal.",
  },
  "revoked-key": {
    status: 401,
    title: "This key was revoked",
    meaning: "The key was valid once and somebody revoked it. It will not work again.",
    remedy: "Use the key that replaced it, or make a new one in the portal.",
  },
  "expired-key": {
    status: 401,
    title: "This key has expired",
    meaning: "The key's expiry, or the overlap after its rotation, has passed.",
    remedy: "Use its successor, or make a new key in the portal.",
  },
  "insufficient-scope": {
    status: 403,
    title: "The key lacks the scope for this operation",
    meaning: "The key is valid but was not given the scope that this operation needs.",
    remedy: "Use a key with the scope named in the detail.",
  },
  "network-not-allowed": {
    status: 403,
    title: "The key may not be used from this network",
    meaning: "The key is restricted to a list of networks and the request came from outside them.",
    remedy: "Call from an allowed network, or change the key's list in the portal.",
  },
  "account-suspended": {
    status: 403,
    title: "The organisation is suspended",
    meaning: "An administrator suspended the organisation that owns this key.",
    remedy: "An owner of the organisation finds the reason in the portal.",
  },
  "not-found": {
    status: 404,
    title: "Nothing here",
    meaning: "There is no such path or record, or it belongs to another organisation or the other environment.",
    remedy: "Check the path and the id, and that the key is of the environment the record was made in.",
  },
  "method-not-allowed": {
    status: 405,
    title: "This path does not take this method",
    meaning: "The path exists but not with this HTTP method.",
    remedy: "Use a method listed in the Allow header.",
  },
  "not-a-draft": {
    status: 409,
    title: "An issued record cannot be changed",
    meaning: "The traverse was issued, superseded or voided. What was issued stays as it was issued.",
    remedy: "Begin a revision with POST /traverses/{id}/revisions and change that, or void the record with a reason.",
  },
  "not-ready-to-issue": {
    status: 409,
    title: "The traverse is not ready to be issued",
    meaning: "Something that a record has to have is missing. Everything that is missing is listed in errors, each with its place in the traverse.",
    remedy: "Change the draft until nothing is missing, then issue it again.",
  },
  "nothing-to-draw": {
    status: 409,
    title: "There is nothing to draw yet",
    meaning: "The traverse has no duct, or a duct but neither readings nor a layout.",
    remedy: "Change the draft until it has a duct, and readings or a layout.",
  },
  "record-altered": {
    status: 409,
    title: "The stored record is not what was signed",
    meaning: "Somebody changed the record behind the product's back; its signature no longer covers what is stored.",
    remedy: "Do not rely on the record. Report it with the request id; a certificate that you hold can still be checked against the published keys.",
  },
  "not-issued": {
    status: 409,
    title: "Only an issued record can be voided or revised",
    meaning: "The traverse is a draft, or was superseded or voided already.",
    remedy: "Change or delete a draft; revise the traverse that superseded this one.",
  },
  "revision-open": {
    status: 409,
    title: "A revision is already being made",
    meaning: "There is a draft that is to supersede this traverse; the detail names it.",
    remedy: "Go on with that draft, or delete it.",
  },
  "still-in-use": {
    status: 409,
    title: "Others still refer to this",
    meaning: "A project that holds traverses, or an instrument that traverses were taken with, cannot be deleted.",
    remedy: "Delete the drafts that refer to it first. What an issued record refers to stays.",
  },
  "too-many-endpoints": {
    status: 409,
    title: "There are as many webhook endpoints as there may be",
    meaning: "An environment takes at most 20 webhook endpoints.",
    remedy: "Delete one that is no longer needed, or have one endpoint take several types of event.",
  },
  "endpoint-disabled": {
    status: 409,
    title: "The webhook endpoint is disabled",
    meaning: "Nothing is delivered to an endpoint that is disabled; reading it tells since when and why.",
    remedy: "Enable it with PATCH /webhook-endpoints/{id} and { \"enabled\": true }, then repeat the request.",
  },
  "precondition-failed": {
    status: 412,
    title: "Somebody changed it in the meantime",
    meaning: "The ETag in If-Match is not that of the record as it is now, so nothing was changed.",
    remedy: "Read the record again, look at what was changed, and repeat your change with the new ETag.",
  },
  "body-too-large": {
    status: 413,
    title: "The body is too large",
    meaning: "The body is over the limit of this operation, 1 MiB unless the reference says otherwise.",
    remedy: "Send fewer traverses at once, or use the batch operation.",
  },
  "unsupported-media-type": {
    status: 415,
    title: "The body's content type is not taken here",
    meaning: "The operation takes another content type than the one sent.",
    remedy: "Send Content-Type: application/json.",
  },
  "invalid-request": {
    status: 422,
    title: "The request does not fit the operation",
    meaning: "The body is JSON, but fields are missing, unknown, of the wrong type, in a unit that does not belong, or out of bounds. Each is listed in errors.",
    remedy: "Mend every field listed in errors; each pointer is a JSON Pointer (RFC 6901) into the body.",
  },
  "import-has-faults": {
    status: 422,
    title: "The file has faults, so nothing was imported",
    meaning: "Rows or columns of the CSV file cannot be imported as they are. An import is done whole or not at all.",
    remedy: "Mend every row and column listed in errors; a dry run tells whether all is well.",
  },
  "idempotency-key-reused": {
    status: 422,
    title: "The Idempotency-Key was used for another request",
    meaning: "Within the last 24 hours a request with this Idempotency-Key had another method, path or body.",
    remedy: "Make a new Idempotency-Key for each request, and use it again only to repeat that very request.",
  },
  "impossible-input": {
    status: 422,
    title: "The input is not physically possible",
    meaning: "Every field is well-formed, but together they describe something that cannot be, or that lies outside the range in which the equations hold.",
    remedy: "Check the fields listed in errors against the site notes.",
  },
  "burst-limit-reached": {
    status: 429,
    title: "Too many requests in this second",
    meaning: "The organisation sent more requests a second than its plan allows.",
    remedy: "Wait for the time in Retry-After, then go on. Send many traverses in one batch.",
  },
  "quota-reached": {
    status: 429,
    title: "The month's quota is used up",
    meaning: "The organisation has used the requests its plan includes this calendar month (UTC).",
    remedy: "Wait for the new month, or ask for a larger plan.",
  },
  "internal-error": {
    status: 500,
    title: "A fault on our side",
    meaning: "Something went wrong that the request did not cause. It is in our log under the request id.",
    remedy: "Try again once; if it persists, report the request id.",
  },
  "not-signed-in": {
    status: 401,
    title: "Nobody is signed in",
    meaning: "The portal needs to know who asks; there is no session or it has ended.",
    remedy: "Sign in and try again.",
  },
  "sign-in-refused": {
    status: 401,
    title: "E-mail and password do not belong together",
    meaning: "There is no account with this pair of e-mail and password.",
    remedy: "Check both, or reset the password.",
  },
  "too-many-attempts": {
    status: 429,
    title: "Too many attempts",
    meaning: "There were too many failed sign-ins, sign-ups or requests for an e-mail from this address or to it.",
    remedy: "Wait for the time in Retry-After.",
  },
  "role-not-sufficient": {
    status: 403,
    title: "Your role does not allow this",
    meaning: "Viewers read; developers also change keys, webhooks and records; owners do everything.",
    remedy: "Ask an owner of the organisation.",
  },
  "email-not-verified": {
    status: 403,
    title: "The e-mail address is not confirmed yet",
    meaning: "Keys can be made once the e-mail address has been confirmed.",
    remedy: "Open the link in the e-mail, or have it sent again.",
  },
  "forbidden-origin": {
    status: 403,
    title: "The request came from another site",
    meaning: "The portal takes changes only from its own pages.",
    remedy: "Use the portal itself; programs use the API with a key.",
  },
  "link-not-valid": {
    status: 410,
    title: "The link is not valid",
    meaning: "The link was used already, has expired, or a newer one was sent.",
    remedy: "Ask for a new link.",
  },
  "temporarily-unavailable": {
    status: 503,
    title: "Not available at this moment",
    meaning: "A part the operation needs, most likely the database, does not answer. Nothing was stored.",
    remedy: "Repeat the request after the time in Retry-After.",
  },
} as const satisfies Record<string, ProblemType>;

export type ProblemSlug = keyof typeof PROBLEMS;
