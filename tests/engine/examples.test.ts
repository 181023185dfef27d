import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import ts from "typescript";
import { describe, expect, it } from "vitest";

const ENGINE = path.join(import.meta.dirname, "../../lib/airflow");

const sources = readdirSync(ENGINE, { recursive: true, encoding: "utf8" })
  .filter((file) => file.endsWith(".ts") && !file.endsWith(".d.ts"))
  .map((file) => ({ file, source: readFileSync(path.join(ENGINE, file), "utf8") }));

/** Every `@example expression // value` in the engine's documentation. */
const examples = sources.flatMap(({ file, source }) =>
  [...source.matchAll(/@example (.+?) \/\/ (.+?)(?: \*\/)?$/gm)].map(([, expression, value]) => ({ file, expression: expression!, value: value!.trim() })),
);
const exampleTags = sources.reduce((count, { source }) => count + source.split("@example").length - 1, 0);

describe("every example in the engine's documentation", () => {
  it("is found, and is an expression with its value on one line", () => {
    expect(examples.length).toBeGreaterThan(8);
    expect(examples).toHaveLength(exampleTags);
  });

  it.each(examples)("$file: $expression", async ({ file, expression, value }) => {
    const module: Record<string, unknown> = await import(path.join(ENGINE, file));
    const names = Object.keys(module);
    const run = (code: string): unknown => new Function(...names, ts.transpile(`return (${code});`))(...names.map((name) => module[name]));
    const [actual, documented] = [run(expression), run(value)];
    if (typeof documented === "number") expect(actual).toBeCloseTo(documented, 9);
    else if (documented && typeof documented === "object" && "value" in documented) {
      const { value: number, ...rest } = documented as { value: number };
      expect(actual).toMatchObject(rest);
      expect((actual as { value: number }).value).toBeCloseTo(number, 9);
    } else expect(actual).toEqual(documented);
  });
});
