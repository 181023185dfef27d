import { describe, expect, it } from "vitest";
import { ownPath } from "@/lib/http/ownPath";

describe("a path to go on to", () => {
  it.each([
    ["/usage", "/usage"],
    ["/usage?from=2026-11-01&to=2026-11-30#table", "/usage?from=2026-11-01&to=2026-11-30#table"],
    ["/docs/../keys", "/keys"],
    ["/", "/"],
  ])("is taken when it is our own: %s", (asked, path) => {
    expect(ownPath(asked, "/overview")).toBe(path);
  });

  it.each([
    "//elsewhere.example", "/\\elsewhere.example", "\\\\elsewhere.example", "/\t/elsewhere.example", "/\n/elsewhere.example", "/\r\\elsewhere.example", "/.//elsewhere.example", "/a/..//elsewhere.example",
    "https://elsewhere.example/usage", "javascript:alert(1)", "elsewhere.example", " //elsewhere.example", "//[", "", undefined, ["/usage"],
  ])("is not when a browser would leave with it: %j", (asked) => {
    expect(ownPath(asked, "/overview")).toBe("/overview");
    // What it gives stays here, as a browser reads it.
    expect(new URL(ownPath(asked, "/overview"), "https://here.example").host).toBe("here.example");
  });
});
