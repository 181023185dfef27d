import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { KEY_PATTERN, makeKeyText, parseKeyText } from "@/lib/keys/keyText";

describe("a key's text", () => {
  it("has the form that the published expression finds", () => {
    expect(KEY_PATTERN.exec(`leaked in a log: ${makeKeyText("production").text}, sadly`)).not.toBeNull();
  });

  it("can be taken apart again", () => {
    const key = makeKeyText("sandbox");
    expect(parseKeyText(key.text)).toEqual({ id: key.id, environment: "sandbox", secretHash: key.secretHash });
  });

  it("is refused when any one character is changed", () => {
    const { text } = makeKeyText("sandbox");
    fc.assert(
      fc.property(fc.nat(text.length - 1), fc.constantFrom(..."0123456789abcdefghjkmnpqrstvwxyzABC_"), (at, character) => {
        fc.pre(text[at] !== character);
        return parseKeyText(text.slice(0, at) + character + text.slice(at + 1)) === null;
      }),
      { numRuns: 500 },
    );
  });

  it("is refused when characters are missing or added", () => {
    const { text } = makeKeyText("sandbox");
    expect([text.slice(1), text.slice(0, -1), `${text}0`, ` ${text}`, ""].map(parseKeyText)).toEqual([null, null, null, null, null]);
  });
});
