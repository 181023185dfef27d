import type { Sample } from "./CodeBlock";

export interface SampleRequest {
  method: "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
  /** Absolute address. */
  url: string;
  /** JSON body. */
  body?: unknown;
  /**
   * A key's own text; left out, the sample reads it from the environment variable AVERDUCT_KEY. Null where the
   * operation takes no key.
   */
  key?: string | null;
}

/** The same request as curl, TypeScript and Python, each complete: it runs when pasted. */
export const requestSamples = (request: SampleRequest): Sample[] => [
  { language: "curl", code: curl(request) },
  { language: "TypeScript", code: typescript(request) },
  { language: "Python", code: python(request) },
];

function curl({ method, url, body, key }: SampleRequest): string {
  const lines = [`curl ${method === "GET" ? "" : `-X ${method} `}${url}`];
  if (key !== null) lines.push(`-H "Authorization: Bearer ${key ?? "$AVERDUCT_KEY"}"`);
  if (body !== undefined) {
    lines.push(`-H "Content-Type: application/json"`);
    // A single quote inside a single-quoted shell word is closed, escaped and opened again.
    lines.push(`-d '${layOut(body).replaceAll("'", `'\\''`)}'`);
  }
  return lines.join(" \\\n  ");
}

function typescript({ method, url, body, key }: SampleRequest): string {
  const bearer = key === undefined ? "`Bearer ${process.env.AVERDUCT_KEY}`" : JSON.stringify(`Bearer ${key}`);
  const headers = [...(key === null ? [] : [`Authorization: ${bearer}`]), ...(body === undefined ? [] : [`"Content-Type": "application/json"`])];
  const options = [
    ...(method === "GET" ? [] : [`method: "${method}"`]),
    ...(headers.length ? [`headers: { ${headers.join(", ")} }`] : []),
    ...(body === undefined ? [] : [`body: JSON.stringify(${indent(layOut(body), 2)})`]),
  ];
  const call = options.length ? `fetch("${url}", {\n  ${options.join(",\n  ")},\n})` : `fetch("${url}")`;
  return `const response = await ${call};\nif (!response.ok) throw new Error(await response.text());\nconsole.log(await response.json());`;
}

function python({ method, url, body, key }: SampleRequest): string {
  const fromEnvironment = key === undefined;
  const bearer = fromEnvironment ? `f"Bearer {os.environ['AVERDUCT_KEY']}"` : JSON.stringify(`Bearer ${key}`);
  const headers = [...(key === null ? [] : [`"Authorization": ${bearer}`]), ...(body === undefined ? [] : [`"Content-Type": "application/json"`])];
  const given = [
    `"${url}"`,
    `method="${method}"`,
    ...(headers.length ? [`headers={${headers.join(", ")}}`] : []),
    ...(body === undefined ? [] : [`data=json.dumps(${indent(pythonLiterals(layOut(body)), 4)}).encode()`]),
  ];
  const imports = ["json", ...(fromEnvironment ? ["os"] : []), "urllib.request"].map((name) => `import ${name}`).join("\n");
  return `${imports}\n\nrequest = urllib.request.Request(\n    ${given.join(",\n    ")},\n)\nwith urllib.request.urlopen(request) as response:\n    print(json.load(response))`;
}

const LONGEST_LINE = 92;

/** JSON with one line for each list of numbers and each small object, as a person would write it. */
export function layOut(value: unknown, depth = 0): string {
  const oneLine = JSON.stringify(value, null, 1)?.replace(/\s*\n\s*/g, " ") ?? "null";
  if (value === null || typeof value !== "object" || oneLine.length + depth * 2 <= LONGEST_LINE) return oneLine;
  const inner = "  ".repeat(depth + 1);
  const outer = "  ".repeat(depth);
  if (Array.isArray(value)) return `[\n${value.map((item) => inner + layOut(item, depth + 1)).join(",\n")}\n${outer}]`;
  const entries = Object.entries(value).filter(([, item]) => item !== undefined);
  return `{\n${entries.map(([name, item]) => `${inner}${JSON.stringify(name)}: ${layOut(item, depth + 1)}`).join(",\n")}\n${outer}}`;
}

const indent = (text: string, by: number): string => text.replaceAll("\n", `\n${" ".repeat(by)}`);

/** JSON's literals outside of strings, in Python's spelling. */
const pythonLiterals = (json: string): string =>
  json.replace(/"(?:[^"\\]|\\.)*"|\btrue\b|\bfalse\b|\bnull\b/g, (token) => ({ true: "True", false: "False", null: "None" })[token] ?? token);
