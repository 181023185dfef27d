import { OpenAPIRegistry, OpenApiGeneratorV31 } from "@asteasolutions/zod-to-openapi";
import { z } from "zod";
import { CALCULATIONS } from "@/lib/airflow/calculations";
import { SCOPES, type OperationDefinition } from "./define";
import { PROBLEMS, type ProblemSlug } from "./problems";
import { OPERATIONS, TAGS } from "./registry";

const problemSchema = z
  .object({
    type: z.url().describe("Address of the page that explains this kind of problem."),
    title: z.string().describe("What kind of problem it is, in a few words."),
    status: z.int().describe("The HTTP status, repeated."),
    detail: z.string().describe("What is wrong with this very request."),
    requestId: z.string().describe("The same as the Request-Id header; quote it when you ask for help."),
    errors: z
      .array(
        z.object({
          pointer: z.string().describe("JSON Pointer (RFC 6901) into the body; empty for the request as a whole."),
          code: z.string().describe("Stable code in snake_case."),
          detail: z.string().describe("What is wrong here and what to do."),
          header: z.string().optional().describe("The header at fault, where it is not the body."),
          parameter: z.string().optional().describe("The query or path parameter at fault, where it is not the body."),
          row: z.int().optional().describe("The row at fault, where the body is a CSV file."),
          column: z.string().nullable().optional().describe("The column at fault, where the body is a CSV file; null for the row as a whole."),
        }),
      )
      .optional()
      .describe("Every fault found, each with its place."),
  })
  .meta({ id: "Problem", description: "What went wrong, as RFC 9457 has it." });

const COMMON_PROBLEMS: ProblemSlug[] = ["internal-error"];
const KEY_PROBLEMS: ProblemSlug[] = [
  "missing-key", "malformed-key", "unknown-key", "revoked-key", "expired-key", "insufficient-scope", "network-not-allowed", "account-suspended",
  "burst-limit-reached", "quota-reached", "temporarily-unavailable",
];
const BODY_PROBLEMS: ProblemSlug[] = ["malformed-json", "body-too-large", "unsupported-media-type", "invalid-request"];

/** Whether an operation makes something that a repeated request should not make twice. */
const takesIdempotencyKey = ({ method, scope }: OperationDefinition): boolean => method === "post" && scope !== null && scope !== "calculations";
const takesIfMatch = ({ method, versioned, status }: OperationDefinition): boolean => versioned === true && method !== "get" && status !== 201;

/** The headers that an operation reads, as the document has them. */
function headersOf(definition: OperationDefinition): z.ZodObject | undefined {
  const headers = {
    ...(takesIdempotencyKey(definition) && { "Idempotency-Key": z.string().max(200).optional().describe("A UUID of yours. The same request with the same key within 24 hours is done once and answered alike.") }),
    ...(takesIfMatch(definition) && { "If-Match": z.string().optional().describe("The ETag you saw; 412 where the record was changed since.") }),
  };
  return Object.keys(headers).length > 0 ? z.object(headers) : undefined;
}

/** All problems an operation can answer with. */
export function problemsOf(definition: OperationDefinition): ProblemSlug[] {
  const slugs = [
    ...(definition.body ? BODY_PROBLEMS.filter((slug) => slug !== "malformed-json" || !definition.bodyMedia) : []),
    ...(definition.query || definition.params ? (["invalid-request"] as const) : []),
    ...(takesIdempotencyKey(definition) ? (["idempotency-key-reused"] as const) : []),
    ...(definition.problems ?? []),
    ...(definition.scope === null ? [] : KEY_PROBLEMS),
    ...COMMON_PROBLEMS,
  ];
  return [...new Set(slugs)];
}

function problemResponses(definition: OperationDefinition): Record<string, object> {
  return Object.fromEntries(
    [...groupByStatus(problemsOf(definition))].map(([status, slugs]) => [
      String(status),
      {
        description: slugs.map((slug) => `\`${slug}\`: ${PROBLEMS[slug].title}.`).join(" "),
        content: { "application/problem+json": { schema: problemSchema } },
      },
    ]),
  );
}

function groupByStatus(slugs: ProblemSlug[]): Map<number, ProblemSlug[]> {
  const groups = new Map<number, ProblemSlug[]>();
  for (const slug of slugs) groups.set(PROBLEMS[slug].status, [...(groups.get(PROBLEMS[slug].status) ?? []), slug]);
  return groups;
}

/** The examples of a calculation with the answers the engine gives to them. */
function examplesOf(definition: OperationDefinition): { request: Record<string, object>; answer: Record<string, object> } | null {
  if (!definition.examples?.length) return null;
  const calculate = CALCULATIONS[definition.path.split("/").at(-1) as keyof typeof CALCULATIONS] as ((input: unknown) => unknown) | undefined;
  const request: Record<string, object> = {};
  const answer: Record<string, object> = {};
  for (const { name, summary, body } of definition.examples) {
    request[name] = { summary, value: body };
    if (calculate) answer[name] = { summary, value: calculate(definition.body!.parse(body)) };
  }
  return { request, answer };
}

const describe = ({ description, figure, scope }: OperationDefinition): string =>
  [
    description,
    ...(figure ? [`With \`Accept: image/svg+xml\` the answer is a drawing. ${figure}`] : []),
    ...(scope ? [`Needs the scope \`${scope}\`.`] : []),
  ].join("\n\n");

function register(registry: OpenAPIRegistry, definition: OperationDefinition): void {
  const examples = examplesOf(definition);
  const status = String(definition.status ?? 200);
  registry.registerPath({
    method: definition.method,
    path: definition.path,
    operationId: definition.id,
    tags: [definition.tag],
    summary: definition.summary,
    description: describe(definition),
    security: definition.scope === null ? [] : [{ apiKey: [] }],
    request: {
      ...(definition.params && { params: definition.params as z.ZodObject }),
      ...(definition.query && { query: definition.query as z.ZodObject }),
      ...(headersOf(definition) && { headers: headersOf(definition)! }),
      ...(definition.body && {
        body: { required: true, content: { [definition.bodyMedia ?? "application/json"]: { schema: definition.body, ...(examples && { examples: examples.request }) } } },
      }),
      ...(definition.form && { body: { required: true, content: { "multipart/form-data": { schema: definition.form } } } }),
    },
    responses: {
      [status]: {
        description: "Done.",
        headers: {
          "Request-Id": { description: "Identifies this request in our logs.", schema: { type: "string" } },
          ...(definition.versioned && status !== "204" && { ETag: { description: "Version of the record, for If-Match.", schema: { type: "string" } } }),
          ...(definition.scope !== null && {
            RateLimit: { description: "What is left of each limit, and the seconds until it is whole again.", schema: { type: "string" } },
            "RateLimit-Policy": { description: "The limits of the plan.", schema: { type: "string" } },
          }),
        },
        ...(status !== "204" && {
          content: definition.media ? Object.fromEntries([definition.media].flat().map((media) => [media, { schema: { type: "string" as const } }])) : {
            "application/json": { schema: definition.answer, ...(examples && { examples: examples.answer }) },
            ...(definition.figure && { "image/svg+xml": { schema: { type: "string" as const, description: definition.figure } } }),
          },
        }),
      },
      ...problemResponses(definition),
    },
  });
}

/** The OpenAPI 3.1 document of the public API. */
export function openApiDocument(): object {
  const registry = new OpenAPIRegistry();
  registry.registerComponent("securitySchemes", "apiKey", {
    type: "http",
    scheme: "bearer",
    description: `An API key, made in the portal. Scopes: ${Object.entries(SCOPES).map(([scope, meaning]) => `\`${scope}\` ${meaning}`).join(" ")}`,
  });
  for (const definition of OPERATIONS) register(registry, definition);
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: "3.1.0",
    info: {
      title: "Averduct",
      version: "1.0.0",
      description:
        "Airflow calculations and stored duct traverse records. Turns duct traverse readings into airflow figures with the working shown, and keeps each traverse as a record that anyone can check.\n\n" +
        "Results support, and do not replace, local codes, the project specification and licensed or certified practice.",
      license: { name: "Proprietary", url: "https://averduct.example/terms" },
    },
    servers: [{ url: "/api/v1", description: "This installation" }],
    tags: Object.entries(TAGS).map(([name, description]) => ({ name, description })),
  });
}

/** The document as it is committed and served. */
export const openApiText = (): string => `${JSON.stringify(openApiDocument(), null, 2)}\n`;
