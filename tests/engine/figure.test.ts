import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { cividis } from "@/lib/airflow/figure/cividis";
import { planFigure, type PlanFigureInput } from "@/lib/airflow/figure/planFigure";
import { readingModel } from "@/lib/airflow/figure/readingModel";
import { resultFigure } from "@/lib/airflow/figure/resultFigure";
import { thumbnail } from "@/lib/airflow/figure/thumbnail";
import { airflow } from "@/lib/airflow/calculations/airflow";
import type { Check } from "@/lib/airflow/checks/check";
import { traversePlan } from "@/lib/airflow/calculations/traversePlan";
import type { Duct, ReadingLines } from "@/lib/airflow/types";
import published from "./figureCividis.json";
import { elementsOf, textBoxes, touching } from "./figureText";

const inches = (value: number) => ({ value, unit: "in" as const });
const millimetres = (value: number) => ({ value, unit: "mm" as const });
const LINED: Duct = { shape: "rectangular", measured: "outside", width: inches(26), height: inches(18), wall: { lining: inches(1) } };
const ROUND: Duct = { shape: "round", measured: "inside", diameter: inches(14), wall: { lining: inches(1) } };
const OVAL: Duct = { shape: "flat_oval", measured: "inside", major: millimetres(900), minor: millimetres(350), wall: { lining: millimetres(25) } };
const LARGE: Duct = { shape: "rectangular", measured: "inside", width: inches(60), height: inches(40) };

const PLANS: Record<string, PlanFigureInput> = {
  "lined rectangle from the top": { duct: LINED, layout: "log_tchebycheff", title: "AHU-1 supply main" },
  "rectangle from the bottom": { duct: LARGE, layout: "equal_area", enterFrom: "bottom" },
  "rectangle from the left": { duct: LARGE, layout: "log_tchebycheff", enterFrom: "left", units: "si" },
  "tall rectangle from the right": { duct: { shape: "rectangular", measured: "inside", width: inches(20), height: inches(90) }, layout: "equal_area", enterFrom: "right" },
  "rectangle by Method 1": { duct: LARGE, layout: "method_1" },
  "round, six points": { duct: ROUND, layout: "log_linear" },
  "round, ten points from the bottom": { duct: ROUND, layout: "log_linear", points: { perDiameter: 10 }, enterFrom: "bottom" },
  "round, three diameters from the right": { duct: ROUND, layout: "log_linear", points: { perDiameter: 8, diameters: 3 }, enterFrom: "right", units: "si" },
  "round, equal area from the left": { duct: ROUND, layout: "equal_area", enterFrom: "left" },
  "stack by Method 1": { duct: { shape: "round", measured: "inside", diameter: inches(30) }, layout: "method_1", points: { perDiameter: 24 } },
  "flat oval": { duct: OVAL, layout: "log_tchebycheff", units: "si" },
  "flat oval from the bottom": { duct: OVAL, layout: "equal_area", enterFrom: "bottom", units: "si" },
  "custom lines": { duct: LARGE, layout: "custom", points: { lines: [{ at: 0.1, depths: [0.2, 0.5, 0.8] }, { at: 0.5, depths: [0.1, 0.9] }] } },
};
const WIDTHS = [720, 360];
const drawings = Object.entries(PLANS).flatMap(([name, input]) => WIDTHS.map((width) => ({ name, input, width, svg: planFigure({ ...input, width }) })));

/** Readings in the shape of a plan. */
const readingsFor = ({ holes }: ReturnType<typeof traversePlan>): ReadingLines => holes.map(({ points }, line) => points.map((_, point) => 1000 + 37 * line + 53 * point));
const results = Object.entries(PLANS).flatMap(([name, { duct, layout, enterFrom, points }]) => {
  const lines = readingsFor(traversePlan({ duct, layout, enterFrom, points }));
  return WIDTHS.map((width) => ({ name, width, lines, svg: resultFigure({ duct, layout, enterFrom, readings: { kind: "velocity", unit: "ft/min", lines }, width }) }));
});

const sizeOf = (svg: string): { width: number; height: number } => {
  const { width, height } = elementsOf(svg)[0]!.attributes;
  return { width: Number(width), height: Number(height) };
};
/** Texts that reach out of the drawing. */
function clipped(svg: string): string[] {
  const { width, height } = sizeOf(svg);
  return textBoxes(svg).flatMap(({ words, left, right, top, bottom }) => (left < -0.5 || right > width + 0.5 || top < 0 || bottom > height ? [words] : []));
}

describe("a plan's drawing", () => {
  it.each(drawings)("$name, $width wide: no text touches another", ({ svg }) => expect(touching(textBoxes(svg))).toEqual([]));
  it.each(drawings)("$name, $width wide: no text is cut off", ({ svg }) => expect(clipped(svg)).toEqual([]));

  it.each(drawings)("$name, $width wide: a blank box for each point to read", ({ svg, input }) => {
    expect(elementsOf(svg).filter(({ name }) => name === "rect")).toHaveLength(traversePlan(input).points);
  });

  const texts = (svg: string): string[] => textBoxes(svg).map(({ words }) => words);

  it("carries the measures of its plan: holes and marks from the outside, the duct's inside", () => {
    const words = texts(planFigure(PLANS["lined rectangle from the top"]!));
    const plan = traversePlan({ duct: LINED, layout: "log_tchebycheff" });
    for (const { alongOutside } of plan.holes) expect(words).toContain(alongOutside.value.toFixed(2));
    for (const { mark } of plan.holes[0]!.points) expect(words).toContain(mark.value.toFixed(2));
    expect(words).toEqual(expect.arrayContaining(["24.00 inside", "16.00 inside"]));
  });
  it("says round a pipe how far it is from hole 1, and on which side", () => {
    const words = texts(planFigure({ duct: ROUND, layout: "log_linear", points: { diameters: 3 } }));
    const arc = ((Math.PI * 16) / 6).toFixed(2);
    expect(words).toEqual(expect.arrayContaining([arc, `at ${arc}`, `at −${arc}`]));
  });
  it("is to scale, wall and lining with it", () => {
    const [outer, , inner] = elementsOf(planFigure(PLANS["lined rectangle from the top"]!)).filter(({ name, attributes }) => name === "path" && /^M[^L]*z$/.test(attributes.d!) && attributes.d!.includes("h"));
    const side = (d: string): [number, number] => /h([\d.]+)v([\d.]+)/.exec(d)!.slice(1).map(Number) as [number, number];
    const [w, h] = side(inner!.attributes.d!);
    const [W, H] = side(outer!.attributes.d!);
    expect(w / h).toBeCloseTo(24 / 16, 2);
    expect(W / w).toBeCloseTo(26 / 24, 3);
    expect(H / h).toBeCloseTo(18 / 16, 3);
  });
  it("shows the cautions unless they stand elsewhere", () => {
    expect(planFigure({ duct: LINED, layout: "log_tchebycheff" })).toMatch(/asbestos/);
    expect(planFigure({ duct: LINED, layout: "log_tchebycheff", cautions: false })).not.toMatch(/asbestos/);
  });
  it("has the same plan in words", () => {
    const [, title, description] = elementsOf(planFigure(PLANS["lined rectangle from the top"]!));
    expect(title).toMatchObject({ name: "title", words: "AHU-1 supply main: rectangular duct, 24.00 × 16.00 in inside, log-Tchebycheff, 25 points" });
    expect(description!.words).toMatch(/^Hole 1: top face, 2.78 in from the left edge; depths from the outside 2.18, 5.61, 9.00, 12.39, 15.82 in\./);
  });
});

describe("a result's drawing", () => {
  it.each(results)("$name, $width wide: no text touches another", ({ svg }) => expect(touching(textBoxes(svg))).toEqual([]));
  it.each(results)("$name, $width wide: no text is cut off", ({ svg }) => expect(clipped(svg)).toEqual([]));

  it.each(results)("$name, $width wide: every reading is written, or it says how many are not", ({ svg, lines }) => {
    const words = textBoxes(svg).map(({ words: written }) => written);
    const unwritten = Number(/^(\d+) readings are not written/.exec(words.find((line) => line.includes("not written")) ?? "")?.[1] ?? 0);
    const written = words.filter((word) => /^\d{4}$/.test(word)).length;
    expect(written + unwritten).toBe(lines.flat().length);
  });
  it.each(results.filter(({ width }) => width === 720))("$name: at the width of a page at most a few are not written", ({ svg, lines }) => {
    const written = textBoxes(svg).filter(({ words }) => /^\d{4}$/.test(words)).length;
    expect(written).toBeGreaterThanOrEqual(0.9 * lines.flat().length);
  });

  const readings = { kind: "velocity_pressure" as const, unit: "in_wg" as const, lines: [[0.061, 0.074, 0.06], [0.071, 0.015, null], [0.075, 0.091, 0.073]] };
  const slip: Check = { code: "possible_slip", passed: false, severity: "caution", detail: "", compared: { quantity: "", value: null, limit: null, unit: null }, source: "", at: [{ line: 2, point: 2 }] };
  const result = { points: airflow({ duct: LINED, readings }).points, checks: [slip] };

  it("needs no more than a duct and lines", () => {
    const svg = resultFigure({ duct: LINED, readings: { lines: readings.lines } });
    expect(textBoxes(svg).map(({ words }) => words)).toEqual(expect.arrayContaining(["0.061", "0.060", "0.091", "reading"]));
  });
  it("colours by velocity from the slowest to the fastest, and says so", () => {
    const svg = resultFigure({ duct: LINED, readings, result });
    const fills = elementsOf(svg).filter(({ name, attributes }) => name === "circle" && attributes.fill!.startsWith("#")).map(({ attributes }) => attributes.fill);
    expect(fills).toHaveLength(8);
    expect(fills).toEqual(expect.arrayContaining([cividis(0), cividis(1)]));
    expect(textBoxes(svg).map(({ words }) => words)).toContain("velocity, ft/min");
  });
  it("rings what looks like a slip, crosses out what was not read, and says both in words", () => {
    const elements = elementsOf(resultFigure({ duct: LINED, readings, result }));
    expect(elements.filter(({ name, attributes }) => name === "circle" && attributes.fill === "none")).toHaveLength(1);
    expect(elements.find(({ name }) => name === "desc")!.words).toBe(
      "Readings in in. w.g., from the hole inwards. Line 1: 0.061, 0.074, 0.060. Line 2: 0.071, 0.015 (looks like a slip), not read. Line 3: 0.075, 0.091, 0.073.",
    );
  });
  it("says when the places are a sketch", () => {
    expect(resultFigure({ duct: LINED, readings: { lines: [[1, 2], [3]] } })).toMatch(/sketch/);
    expect(resultFigure({ duct: LINED, readings: { lines: [[1, 2], [3, 4]] } })).not.toMatch(/sketch/);
  });
});

describe("readings in the cross-section", () => {
  it("lie where the plan has its points", () => {
    const plan = traversePlan({ duct: LINED, layout: "log_tchebycheff", units: "si" });
    const model = readingModel({ duct: LINED, layout: "log_tchebycheff", readings: { lines: readingsFor(plan) } });
    const places = plan.holes.flatMap(({ points }) => points.map(({ position }) => [position.x.value / 1000, position.y.value / 1000]));
    for (const [index, { x, y }] of model.readings.entries()) {
      expect(x).toBeCloseTo(places[index]![0]!, 9);
      expect(y).toBeCloseTo(places[index]![1]!, 9);
    }
  });
  it("have no range where nothing was read", () => expect(readingModel({ duct: ROUND, readings: { lines: [[null, null]] } }).range).toBeNull());
});

describe("a thumbnail", () => {
  it("has a point for each reading and no text but its name", () => {
    const elements = elementsOf(thumbnail({ duct: OVAL, readings: { lines: [[1, 2, 3], [4, 5, 6]] } }));
    expect(elements.filter(({ name }) => name === "circle")).toHaveLength(6);
    expect(elements.some(({ name }) => name === "text")).toBe(false);
    expect(elements.find(({ name }) => name === "title")!.words).toBe("flat oval duct, 35.43 × 13.78 in inside, 6 points");
  });
});

describe("any drawing", () => {
  it("escapes what a caller writes", () => {
    const title = `</text><script>alert("1")</script> & 'AHU'\u0000\uFFFF`;
    for (const svg of [planFigure({ duct: LINED, layout: "log_tchebycheff", title }), resultFigure({ duct: LINED, readings: { lines: [[1]] }, title })]) {
      const elements = elementsOf(svg);
      expect(elements.map(({ name }) => name)).not.toContain("script");
      expect(elements.find(({ name }) => name === "title")!.words).toMatch(/^<\/text><script>alert\("1"\)<\/script> & 'AHU':/);
    }
  });
  it("is an image with a name and a description, its colours the page's or paper's", () => {
    for (const svg of [planFigure({ duct: LINED, layout: "log_tchebycheff" }), resultFigure({ duct: LINED, readings: { lines: [[1]] } }), thumbnail({ duct: LINED, readings: { lines: [[1]] } })]) {
      const [root, title, description] = elementsOf(svg);
      expect(root!.attributes).toMatchObject({ role: "img", xmlns: "http://www.w3.org/2000/svg", fill: "var(--ink, #18211f)" });
      expect(title!.words).not.toBe("");
      expect(description!.words).not.toBe("");
    }
  });
  it("is well-formed and finite for any duct and any readings", () => {
    const length = fc.double({ min: 0.02, max: 20, noNaN: true }).map((value) => ({ value, unit: "m" as const }));
    const wall = fc.option(fc.record({ lining: fc.double({ min: 0, max: 0.2, noNaN: true }).map((value) => ({ value, unit: "m" as const })) }), { nil: undefined });
    const duct: fc.Arbitrary<Duct> = fc.oneof(
      fc.record({ shape: fc.constant("rectangular" as const), measured: fc.constant("inside" as const), width: length, height: length, wall }),
      fc.record({ shape: fc.constant("round" as const), measured: fc.constant("inside" as const), diameter: length, wall }),
      fc.tuple(length, fc.double({ min: 1, max: 4.9, noNaN: true }), wall).map(([minor, ratio, lining]) => ({ shape: "flat_oval" as const, measured: "inside" as const, minor, major: { value: minor.value * ratio, unit: "m" as const }, wall: lining })),
    );
    const lines = fc.array(fc.array(fc.option(fc.double({ min: -1e6, max: 1e6, noNaN: true })), { minLength: 1, maxLength: 12 }), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(duct, lines, fc.string(), fc.integer({ min: 0, max: 2000 }), (theDuct, read, title, width) => {
        const plan = planFigure({ duct: theDuct, layout: "equal_area", title, width });
        for (const svg of [resultFigure({ duct: theDuct, readings: { lines: read }, title, width }), thumbnail({ duct: theDuct, readings: { lines: read } }), plan]) {
          const elements = elementsOf(svg);
          const numbers = elements.flatMap(({ attributes }) => Object.entries(attributes).filter(([name]) => name !== "xmlns").map(([, value]) => value));
          if (numbers.some((value) => /NaN|Infinity|undefined/.test(value))) return false;
        }
        return true;
      }),
      { numRuns: 40 },
    );
  });
});

describe("cividis", () => {
  const entries = published.entries.split(" ").map((hex) => `#${hex}`);
  const channels = (colour: string): number[] => [1, 3, 5].map((at) => parseInt(colour.slice(at, at + 2), 16));

  it(`has the published colours at its anchors (${published.source})`, () => {
    const anchors = entries.filter((_, index) => index % 15 === 0);
    expect(anchors.map((_, index) => cividis((15 * index) / 255))).toEqual(anchors);
  });
  it("is within 3 of 255 of the published colours between them, but for the bends at its ends, where it is within 11", () => {
    const off = entries.map((entry, index) => Math.max(...channels(entry).map((value, channel) => Math.abs(value - channels(cividis(index / 255))[channel]!))));
    expect(Math.max(...off)).toBeLessThanOrEqual(11);
    expect(Math.max(...off.filter((_, index) => index < 15 || (index > 30 && index < 240)))).toBeLessThanOrEqual(3);
  });
  it("grows lighter all the way, so that it is read without colour", () => {
    const luminance = (share: number): number => {
      const [r, g, b] = channels(cividis(share)).map((value) => (value / 255 <= 0.04045 ? value / 255 / 12.92 : ((value / 255 + 0.055) / 1.055) ** 2.4)) as [number, number, number];
      return 0.2126 * r + 0.7152 * g + 0.0722 * b;
    };
    for (let step = 1; step <= 100; step += 1) expect(luminance(step / 100)).toBeGreaterThan(luminance((step - 1) / 100));
  });
  it("takes values beyond its ends as the ends", () => {
    expect(cividis(-1)).toBe(cividis(0));
    expect(cividis(2)).toBe(cividis(1));
  });
});

describe("the colours of a traverse with a slip", () => {
  it("are spread over the readings that are no slips", () => {
    const lines = [[900, 1000, 1010, 960, 890], [905, 1004, 1020, 970, 893], [902, 9990, 1015, 965, 891]];
    const checks = [{ code: "possible_slip", passed: false, at: [{ line: 3, point: 2 }] }] as never;
    const { range } = readingModel({ duct: { shape: "rectangular", measured: "inside", width: { value: 20, unit: "in" }, height: { value: 12, unit: "in" } }, readings: { kind: "velocity", unit: "ft/min", lines }, result: { checks } });
    expect(range).toEqual({ low: 890, high: 1020 });
  });
});
