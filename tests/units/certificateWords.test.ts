import { describe, expect, it } from "vitest";
import { digits, fixed, quantity, unitSymbol } from "@/lib/certificate/quantities";
import { condense } from "@/lib/certificate/sections/condense";
import { Fonts } from "@/lib/certificate/type/fonts";
import { lineOf, runsOf } from "@/lib/certificate/type/runs";
import type { Measurement } from "@/lib/records/issuedDocument";
import { issued, SUPPLY_MAIN } from "./certificateReader";

describe("words of a certificate", () => {
  it("sets each character in the first font that has it", () => {
    const fonts = new Fonts();
    const files = (words: string): string[] => runsOf(words, "text", fonts).map(({ file }) => file.split("/")[0]!);
    expect(files("Supply main")).toEqual(["instrument-sans"]);
    expect(files("Łódź")).toEqual(["instrument-sans", "instrument-sans", "instrument-sans"]);
    expect(files("ρ Q")).toEqual(["dejavu-sans", "instrument-sans"]);
    expect(files("漢字")).toEqual(["unifontex"]);
  });

  it("keeps a letter and its mark in one font", () => {
    const runs = runsOf("A V\u0304", "text", new Fonts());
    expect(runs.map(({ words }) => words)).toEqual(["A ", "V\u0304"]);
  });

  it("orders right-to-left words as they are read (UAX #9, rule L2)", () => {
    // Logical: a, alef bet, 12, gimel, b. On paper from the left: a, gimel, 12, alef bet (which the font turns), b.
    const words = runsOf("a \u05d0\u05d1 12 \u05d2 b", "text", new Fonts()).map(({ words: run }) => run.trim()).filter((run) => run !== "");
    expect(words).toEqual(["a", "\u05d2", "12", "\u05d0\u05d1", "b"]);
  });

  it("takes control characters and halves of pairs out of a line", () => {
    expect(lineOf("a\u0000b\tc\ud83d")).toBe("a b c\ufffd");
  });

  it("writes a character that no font has by its number", () => {
    expect(runsOf("\u{10fffd}", "text", new Fonts()).map(({ words }) => words)).toEqual(["[U+10FFFD]"]);
  });

  it("writes numbers with separated thousands, a true minus sign and no digit lost before the point", () => {
    expect([digits(2526.704, 6), digits(-10.2891, 6), digits(1234567, 3), digits(0, 4), digits(0.0720179, 4)]).toEqual(["2,526.7", "−10.2891", "1,234,567", "0", "0.07202"]);
    expect([fixed(-0.001, 2), fixed(2.5, 2), fixed(-3, 0)]).toEqual(["0.00", "2.50", "−3"]);
    expect([unitSymbol("ft3/min"), unitSymbol("kg/m3"), unitSymbol("in_wg"), quantity({ value: 0.9602, unit: "1" })]).toEqual(["ft³/min", "kg/m³", "in. w.g.", "0.9602"]);
  });
});

describe("the condensed working", () => {
  it("has each step once, and every input either given or found by a step before", () => {
    const { result } = issued();
    const steps = condense(result.working!, result.uncertainty.budget);
    expect(steps.map(({ step }) => step).filter((step) => step.includes("each point"))).toEqual(["Velocity at each point"]);
    expect(new Set(steps.map(({ step }) => step)).size).toBe(steps.length);
    const known = new Set([...steps.flatMap(({ value, given }) => [...(value ? [value] : []), ...given.map(([, input]) => input)]), ...result.uncertainty.budget.map(({ percent }) => ({ value: percent, unit: "percent" }))].map(({ value, unit }) => `${value} ${unit}`));
    const readings = new Set(SUPPLY_MAIN.readings.lines.flat());
    const lost = result.working!.flatMap(({ inputs }) => Object.values(inputs)).filter(({ value, unit }) => !known.has(`${value} ${unit}`) && !readings.has(value));
    expect(lost).toEqual([]);
  });

  it("says at how many points an equation was used where there are several", () => {
    const lines = SUPPLY_MAIN.readings.lines.map((line) => [...line]);
    lines[0]![0] = -0.002;
    lines[0]![1] = 1.9;
    const { result } = issued({ ...SUPPLY_MAIN, readings: { ...SUPPLY_MAIN.readings, lines } as Measurement["readings"] });
    const steps = condense(result.working!, result.uncertainty.budget).map(({ step }) => step).filter((step) => step.includes("point"));
    expect(steps).toEqual(["Reading at line 1, point 1", "Velocity at 24 points", "Velocity at line 1, point 2"]);
  });
});
