import { describe, expect, it } from "vitest";
import { AirflowInputError } from "@/lib/airflow/errors";
import { traversePlan, type TraversePlanAnswer, type TraversePlanInput } from "@/lib/airflow/calculations/traversePlan";
import type { Duct } from "@/lib/airflow/types";

const inches = (value: number) => ({ value, unit: "in" as const });
const millimetres = (value: number) => ({ value, unit: "mm" as const });
const rectangular = (width: number, height: number): Duct => ({ shape: "rectangular", measured: "inside", width: inches(width), height: inches(height) });
const round = (diameter: number): Duct => ({ shape: "round", measured: "inside", diameter: inches(diameter) });
const OVAL: Duct = { shape: "flat_oval", measured: "inside", major: inches(36), minor: inches(14) };
const LINED: Duct = { shape: "rectangular", measured: "outside", width: inches(26), height: inches(18), wall: { thickness: inches(0), lining: inches(1) } };

const gridOf = ({ holes }: TraversePlanAnswer): string => `${holes.length}x${holes[0]!.points.length}`;
const checkOf = ({ checks }: TraversePlanAnswer, code: string) => checks.find((check) => check.code === code);

function faultsOf(input: TraversePlanInput): { path: string; code: string }[] {
  try {
    traversePlan(input);
  } catch (error) {
    if (error instanceof AirflowInputError) return error.faults.map(({ path, code }) => ({ path: path.join("/"), code }));
    throw error;
  }
  return [];
}

describe("a plan of a lined rectangular duct entered from the top", () => {
  const plan = traversePlan({ duct: LINED, layout: "log_tchebycheff" });

  it("has five holes across 24 in and five points down 16 in", () => {
    expect(gridOf(plan)).toBe("5x5");
    expect(plan).toMatchObject({ points: 25, minimumPoints: 25 });
  });
  it("measures its holes from the left, inside and outside", () => {
    const [first] = plan.holes;
    expect(first).toMatchObject({ number: 1, face: "top", edge: "left", angle: null });
    expect(first!.along.value).toBeCloseTo(24 * 0.074, 12);
    expect(first!.alongOutside.value).toBeCloseTo(24 * 0.074 + 1, 12);
  });
  it("adds the lining to the depth from outside, where the mark goes", () => {
    const [point] = plan.holes[0]!.points;
    expect(point!.fromInside.value).toBeCloseTo(16 * 0.074, 12);
    expect(point!.fromOutside.value).toBeCloseTo(16 * 0.074 + 1, 12);
    expect(point!.mark).toEqual(point!.fromOutside);
  });
  it("needs a probe that reaches the farthest point", () => expect(plan.probeLength.value).toBeCloseTo(16 * 0.926 + 1, 12));
  it("shows cautions", () => expect(plan.cautions.join(" ")).toMatch(/asbestos/));
});

describe("the face entered", () => {
  const at = (enterFrom: "top" | "bottom" | "left" | "right") => traversePlan({ duct: rectangular(40, 20), layout: "log_tchebycheff", enterFrom });

  it.each([["top", "7x5", "left"], ["bottom", "7x5", "left"], ["left", "5x7", "top"], ["right", "5x7", "top"]] as const)("%s: %s, measured from the %s", (face, grid, edge) => {
    const plan = at(face);
    expect(gridOf(plan)).toBe(grid);
    expect(plan.holes.every((hole) => hole.face === face && hole.edge === edge)).toBe(true);
  });
  it("reads the same places from opposite faces", () => {
    const places = (face: "top" | "bottom" | "left" | "right") =>
      at(face).holes.flatMap(({ points }) => points.map(({ position: { x, y } }) => `${x.value.toFixed(9)}/${y.value.toFixed(9)}`)).sort();
    expect(places("bottom")).toEqual(places("top"));
    expect(places("left")).toEqual(places("top"));
    expect(places("right")).toEqual(places("top"));
  });
});

describe("the fewest points when none are asked for", () => {
  it.each<[string, TraversePlanInput, string, number]>([
    ["log-Tchebycheff under 30 in", { duct: rectangular(29.9, 29.9), layout: "log_tchebycheff" }, "5x5", 25],
    ["log-Tchebycheff at 30 and at 36 in", { duct: rectangular(36, 30), layout: "log_tchebycheff" }, "6x6", 36],
    ["log-Tchebycheff over 36 in", { duct: rectangular(36.1, 12), layout: "log_tchebycheff" }, "7x5", 35],
    ["log-Tchebycheff, 36 in that come from outside dimensions", { duct: { shape: "rectangular", measured: "outside", width: inches(38.2), height: inches(32.2), wall: { lining: inches(1.1) } }, layout: "log_tchebycheff" }, "6x6", 36],
    ["equal area of a small duct: 16", { duct: rectangular(12, 12), layout: "equal_area" }, "4x4", 16],
    ["equal area, 6 in between centres", { duct: rectangular(36, 24), layout: "equal_area" }, "6x4", 24],
    ["equal area, at most 64", { duct: rectangular(120, 120), layout: "equal_area" }, "8x8", 64],
    ["equal area of a long flat duct", { duct: rectangular(240, 6), layout: "equal_area" }, "40x1", 40],
    ["equal area, round from 10 in", { duct: round(10), layout: "equal_area" }, "2x10", 20],
    ["equal area, round under 10 in", { duct: round(9.9), layout: "equal_area" }, "2x6", 12],
    ["log-linear", { duct: round(14), layout: "log_linear" }, "2x6", 12],
    ["Method 1 where nothing is known of the site", { duct: round(30), layout: "method_1" }, "2x8", 16],
    ["Method 1, longer row on the longer side", { duct: rectangular(30, 60), layout: "method_1", site: { downstream: inches(400), upstream: inches(100) } }, "3x4", 12],
  ])("%s", (_, input, grid, minimum) => {
    const plan = traversePlan(input);
    expect(gridOf(plan)).toBe(grid);
    expect(plan.minimumPoints).toBe(minimum);
    expect(checkOf(plan, "points_below_minimum")).toMatchObject({ passed: true });
  });
});

describe("a plan of a round duct", () => {
  const plan = traversePlan({ duct: { ...round(14), wall: { lining: inches(1) } }, layout: "log_linear" });

  it("has a second hole a quarter of the way round, with a tape on the outside", () => {
    expect(plan.holes[1]).toMatchObject({ face: "right", edge: "hole_1_clockwise", angle: 90 });
    expect(plan.holes[1]!.along.value).toBeCloseTo((Math.PI * 14) / 4, 12);
    expect(plan.holes[1]!.alongOutside.value).toBeCloseTo((Math.PI * 16) / 4, 12);
  });
  it("has three holes on the side entered when three are asked for", () => {
    const { holes } = traversePlan({ duct: round(14), layout: "log_linear", points: { diameters: 3 }, enterFrom: "bottom" });
    expect(holes.map(({ angle, edge }) => ({ angle, edge }))).toEqual([
      { angle: 180, edge: "hole_1_clockwise" },
      { angle: 240, edge: "hole_1_clockwise" },
      { angle: 120, edge: "hole_1_anticlockwise" },
    ]);
  });
});

describe("a plan of a flat oval duct", () => {
  const plan = traversePlan({ duct: OVAL, layout: "log_tchebycheff" });

  it("says that there is no source for it", () => expect(plan.source).toMatch(/common practice, no source/));
  it("has lines through the flat and two radii in each end", () => {
    expect(plan.holes.map(({ face, points }) => `${face} ${points.length}`)).toEqual([...Array<string>(4).fill("top 5"), "left 5", "left 5", "right 5", "right 5"]);
    expect(plan.points).toBe(40);
  });
  it("has no more than 64 points in its middle, however long it is", () => {
    const long = traversePlan({ duct: { shape: "flat_oval", measured: "inside", major: { value: 20, unit: "m" }, minor: { value: 2, unit: "m" } }, layout: "equal_area" });
    expect(long.holes.filter(({ angle }) => angle === null).flatMap(({ points }) => points)).toHaveLength(64);
  });
  it("gives each part the weight of its area", () => {
    const middle = plan.holes.filter(({ angle }) => angle === null).flatMap(({ points }) => points).reduce((sum, { weight }) => sum + weight, 0);
    expect(middle).toBeCloseTo((14 * 22) / (14 * 22 + Math.PI * 49), 12);
  });
  it("is that of a round duct turned by 45° where both axes are the same", () => {
    const oval = traversePlan({ duct: { shape: "flat_oval", measured: "inside", major: inches(14), minor: inches(14) }, layout: "equal_area" });
    const diameters = traversePlan({ duct: round(14), layout: "equal_area" });
    expect(oval.points).toBe(diameters.points);
    expect(oval.holes[0]!.points.map(({ fromInside }) => fromInside.value)).toEqual(diameters.holes[0]!.points.slice(0, 5).map(({ fromInside }) => expect.closeTo(fromInside.value, 9) as number));
  });
});

describe("Method 1's wall limit", () => {
  const plan = traversePlan({ duct: round(30), layout: "method_1", points: { perDiameter: 24 } });

  it("makes one of points that it moves to the same place, which counts for both", () => {
    const points = plan.holes[0]!.points;
    expect(points).toHaveLength(22);
    expect(points[0]).toMatchObject({ standsFor: 2 });
    expect(points[0]!.fromInside.value).toBeCloseTo(1, 12);
    expect(points[0]!.weight).toBeCloseTo(2 * points[1]!.weight, 12);
    expect(points.at(-1)!.fromInside.value).toBeCloseTo(29, 12);
  });
  it("leaves the count of the rule", () => expect(checkOf(plan, "points_below_minimum")).toMatchObject({ passed: true, compared: { value: 48 } }));
  it("then holds everywhere", () => expect(checkOf(plan, "near_wall")).toMatchObject({ passed: true }));
});

describe("a custom layout", () => {
  const lines = [{ at: 0.25, depths: [0.2, 0.8], weights: [1, 3] }, { at: 0.75, depths: [0.5] }];

  it("takes places and weights as they are, weights scaled to 1", () => {
    const plan = traversePlan({ duct: rectangular(40, 20), layout: "custom", points: { lines } });
    expect(plan.holes.map(({ along, points }) => [along.value, points.map(({ fromInside, weight }) => [fromInside.value, weight])])).toEqual([
      [expect.closeTo(10, 9), [[expect.closeTo(4, 9), 0.2], [expect.closeTo(16, 9), 0.6]]],
      [expect.closeTo(30, 9), [[expect.closeTo(10, 9), 0.2]]],
    ]);
    expect(plan.minimumPoints).toBeNull();
    expect(checkOf(plan, "points_below_minimum")).toBeUndefined();
  });
  it("follows the curve at a flat oval's end", () => {
    const plan = traversePlan({ duct: { ...OVAL, wall: { lining: inches(1) } }, layout: "custom", points: { lines: [{ at: 1 / 36, depths: [0.5] }] } });
    const half = Math.sqrt(7 ** 2 - 6 ** 2);
    expect(plan.holes[0]!.points[0]!.fromInside.value).toBeCloseTo(half, 9);
    expect(plan.holes[0]!.points[0]!.fromOutside.value).toBeCloseTo(Math.sqrt(8 ** 2 - 6 ** 2), 9);
  });
  it("enters a flat oval along its major axis", () => {
    const plan = traversePlan({ duct: OVAL, layout: "custom", enterFrom: "left", points: { lines: [{ at: 0.5, depths: [0.5] }] } });
    expect(plan.holes[0]!.points[0]!.fromInside.value).toBeCloseTo(18, 9);
  });
  it("measures the holes of a round duct from its first", () => {
    const { holes } = traversePlan({ duct: round(20), layout: "custom", points: { lines: [{ angle: 30, depths: [0.5] }, { angle: -30, depths: [0.5] }] } });
    expect(holes.map(({ edge, along, angle }) => ({ edge, along: along.value, angle }))).toEqual([
      { edge: "hole_1_clockwise", along: 0, angle: 30 },
      { edge: "hole_1_anticlockwise", along: expect.closeTo((Math.PI * 20) / 6, 9) as number, angle: 330 },
    ]);
  });
  it("places the lines of a round duct by their angle", () => {
    const plan = traversePlan({ duct: round(20), layout: "custom", points: { lines: [{ angle: 45, depths: [0.25] }] } });
    expect(plan.holes[0]!.points[0]!.position).toEqual({ x: { value: expect.closeTo(10 + 5 * Math.SQRT1_2, 9) as number, unit: "in" }, y: { value: expect.closeTo(10 + 5 * Math.SQRT1_2, 9) as number, unit: "in" } });
  });
});

describe("checks of a plan", () => {
  it("names what is below the minimum", () => {
    const few = (input: Omit<TraversePlanInput, "layout">, layout: TraversePlanInput["layout"]) => checkOf(traversePlan({ ...input, layout }), "points_below_minimum");
    expect(few({ duct: rectangular(40, 20), points: { across: 5 } }, "log_tchebycheff")).toMatchObject({ passed: false, compared: { quantity: "points across the width", value: 5, limit: 7 } });
    expect(few({ duct: rectangular(40, 20), points: { across: 4, down: 4 } }, "equal_area")).toMatchObject({ passed: false, compared: { quantity: "distance between cell centres", value: expect.closeTo(10, 9) as number, limit: expect.closeTo(6, 9) as number, unit: "in" } });
    expect(few({ duct: rectangular(20, 20), points: { across: 3, down: 3 } }, "equal_area")).toMatchObject({ passed: false, compared: { value: 9, limit: 16 } });
    expect(few({ duct: rectangular(200, 200), points: { across: 8, down: 8 } }, "equal_area")).toMatchObject({ passed: true });
    expect(few({ duct: round(20), points: { perDiameter: 4 } }, "log_linear")).toMatchObject({ passed: false, compared: { value: 4, limit: 6 } });
    expect(few({ duct: round(20), points: { perDiameter: 6 } }, "method_1")).toMatchObject({ passed: false, compared: { value: 12, limit: 16 } });
  });
  it("reports points nearer the wall than Method 1 allows, and which", () => {
    const check = checkOf(traversePlan({ duct: round(12), layout: "log_linear", points: { perDiameter: 10 } }), "near_wall");
    expect(check).toMatchObject({ passed: false, compared: { value: expect.closeTo(12 * 0.019, 9) as number, limit: expect.closeTo(0.5, 9) as number, unit: "in" } });
    expect(check!.at).toEqual([{ line: 1, point: 1 }, { line: 1, point: 10 }, { line: 2, point: 1 }, { line: 2, point: 10 }]);
  });
  it("keeps a thick probe its own thickness off the wall", () => {
    expect(checkOf(traversePlan({ duct: rectangular(40, 20), layout: "log_tchebycheff", probe: { diameter: inches(2) } }), "near_wall")).toMatchObject({ passed: false, compared: { limit: 2 } });
  });
  it("says when the probe is too short, and when the opposite face would do", () => {
    const short = checkOf(traversePlan({ duct: rectangular(24, 40), layout: "log_tchebycheff", probe: { length: inches(36) } }), "probe_length");
    expect(short).toMatchObject({ passed: false, severity: "failure", compared: { value: 36, limit: expect.closeTo(37.88, 9) as number } });
    expect(short!.detail).toMatch(/opposite face/);
    expect(checkOf(traversePlan({ duct: rectangular(24, 40), layout: "log_tchebycheff", probe: { length: inches(37.88) } }), "probe_length")).toMatchObject({ passed: true });
  });
  it("fails Method 1 in a duct under 0.30 m", () => {
    expect(checkOf(traversePlan({ duct: { shape: "round", measured: "inside", diameter: millimetres(299) }, layout: "method_1" }), "duct_below_minimum")).toMatchObject({ passed: false, severity: "failure" });
    expect(checkOf(traversePlan({ duct: { shape: "round", measured: "inside", diameter: millimetres(300) }, layout: "method_1" }), "duct_below_minimum")).toMatchObject({ passed: true });
  });
  it("compares the probe's thickness with the duct", () => {
    expect(checkOf(traversePlan({ duct: round(10), layout: "log_linear", probe: { diameter: inches(0.3125) } }), "probe_blockage")).toMatchObject({ passed: false });
  });
});

describe("the site", () => {
  const straight = (downstream: number, upstream: number) => ({ downstream: inches(downstream * 20), upstream: inches(upstream * 20) });
  const siteOf = (layout: "log_linear" | "method_1", site?: TraversePlanInput["site"]) => traversePlan({ duct: round(20), layout, site });

  it("is held against both rules, each named", () => {
    const { site } = siteOf("log_linear", straight(7.5, 3));
    expect(site.downstreamDiameters).toBeCloseTo(7.5, 12);
    expect(site.rules.map(({ name, meets }) => ({ name, meets }))).toEqual([{ name: "ashrae_111", meets: true }, { name: "method_1", meets: false }]);
  });
  it("decides the check by the rule of the layout", () => {
    expect(checkOf(siteOf("log_linear", straight(8, 2)), "site_disturbance")).toMatchObject({ passed: false, compared: { value: expect.closeTo(2, 9) as number, limit: 3 } });
    expect(checkOf(siteOf("method_1", straight(8, 2)), "site_disturbance")).toMatchObject({ passed: true });
  });
  it("fails where Method 1 allows no traverse at all", () => {
    expect(checkOf(siteOf("method_1", straight(5, 1)), "site_disturbance")).toMatchObject({ passed: false, severity: "caution" });
    expect(checkOf(siteOf("method_1", straight(5, 0.4)), "site_disturbance")).toMatchObject({ passed: false, severity: "failure", compared: { value: expect.closeTo(0.4, 9) as number, limit: 0.5 } });
  });
  it("is undecided where a length is not known", () => {
    expect(siteOf("log_linear").site.rules.map(({ meets }) => meets)).toEqual([null, null]);
    expect(siteOf("log_linear", { downstream: inches(200) }).site.rules.map(({ meets }) => meets)).toEqual([null, null]);
    expect(siteOf("log_linear", { downstream: inches(20) }).site.rules.map(({ meets }) => meets)).toEqual([false, false]);
    expect(checkOf(siteOf("log_linear"), "site_disturbance")).toBeUndefined();
  });
});

describe("what cannot be planned", () => {
  it.each<[string, TraversePlanInput, string, string]>([
    ["log-Tchebycheff in a round duct", { duct: round(20), layout: "log_tchebycheff" }, "layout", "layout_not_for_shape"],
    ["log-linear in a rectangular duct", { duct: rectangular(20, 20), layout: "log_linear" }, "layout", "layout_not_for_shape"],
    ["Method 1 in a flat oval duct", { duct: OVAL, layout: "method_1" }, "layout", "layout_not_for_shape"],
    ["diameters in a rectangular duct", { duct: rectangular(20, 20), layout: "equal_area", points: { diameters: 2 } }, "points/diameters", "points_not_for_layout"],
    ["a grid in a round duct", { duct: round(20), layout: "equal_area", points: { across: 5 } }, "points/across", "points_not_for_layout"],
    ["lines of one's own with a rule", { duct: round(20), layout: "log_linear", points: { lines: [{ depths: [0.5] }] } }, "points/lines", "points_not_for_layout"],
    ["half a point", { duct: rectangular(20, 20), layout: "equal_area", points: { across: 4.5 } }, "points/across", "count_not_whole"],
    ["8 log-Tchebycheff points", { duct: rectangular(20, 20), layout: "log_tchebycheff", points: { down: 8 } }, "points/down", "count_not_in_table"],
    ["12 log-linear points", { duct: round(20), layout: "log_linear", points: { perDiameter: 12 } }, "points/perDiameter", "count_not_in_table"],
    ["an odd diameter", { duct: round(20), layout: "equal_area", points: { perDiameter: 7 } }, "points/perDiameter", "count_not_even"],
    ["one diameter", { duct: round(20), layout: "equal_area", points: { diameters: 1 } }, "points/diameters", "diameters_not_possible"],
    ["three diameters by Method 1", { duct: round(20), layout: "method_1", points: { diameters: 3 } }, "points/diameters", "diameters_not_possible"],
    ["a grid that Table 1-1 does not have", { duct: rectangular(20, 20), layout: "method_1", points: { across: 5, down: 3 } }, "points", "count_not_in_table"],
    ["26 points on a diameter by Method 1", { duct: round(60), layout: "method_1", points: { perDiameter: 26 } }, "points/perDiameter", "count_not_in_table"],
    ["more than 1,000 points", { duct: rectangular(20, 20), layout: "equal_area", points: { across: 40, down: 40 } }, "points", "too_many_points"],
    ["a flat oval from its end", { duct: OVAL, layout: "equal_area", enterFrom: "left" }, "enterFrom", "face_not_possible"],
    ["lines in the middle of an oval that has none", { duct: { shape: "flat_oval", measured: "inside", major: inches(14), minor: inches(14) }, layout: "equal_area", points: { across: 2 } }, "points/across", "no_flat_middle"],
    ["a custom layout without lines", { duct: round(20), layout: "custom" }, "points", "custom_lines_missing"],
    ["a custom layout with a count", { duct: round(20), layout: "custom", points: { diameters: 2, lines: [{ depths: [0.5] }] } }, "points/diameters", "points_not_for_layout"],
    ["a custom line without its place", { duct: rectangular(20, 20), layout: "custom", points: { lines: [{ depths: [0.5] }] } }, "points/lines/0", "line_without_place"],
    ["a custom line in the wall", { duct: rectangular(20, 20), layout: "custom", points: { lines: [{ at: 1, depths: [0.5] }] } }, "points/lines/0/at", "place_out_of_range"],
    ["a custom line by angle in a rectangle", { duct: rectangular(20, 20), layout: "custom", points: { lines: [{ angle: 10, depths: [0.5] }] } }, "points/lines/0/angle", "points_not_for_layout"],
    ["a custom line by place in a pipe", { duct: round(20), layout: "custom", points: { lines: [{ at: 0.5, depths: [0.5] }] } }, "points/lines/0/at", "points_not_for_layout"],
    ["an angle beyond a turn", { duct: round(20), layout: "custom", points: { lines: [{ angle: 400, depths: [0.5] }] } }, "points/lines/0/angle", "angle_out_of_range"],
    ["a custom line without points", { duct: round(20), layout: "custom", points: { lines: [{ depths: [] }] } }, "points/lines/0/depths", "line_without_points"],
    ["a depth beyond the duct", { duct: round(20), layout: "custom", points: { lines: [{ depths: [0.5, 1.2] }] } }, "points/lines/0/depths/1", "place_out_of_range"],
    ["depths that go back", { duct: round(20), layout: "custom", points: { lines: [{ depths: [0.5, 0.4] }] } }, "points/lines/0/depths/1", "depths_not_ascending"],
    ["weights that are too few", { duct: round(20), layout: "custom", points: { lines: [{ depths: [0.5, 0.6], weights: [1] }] } }, "points/lines/0/weights", "weights_do_not_fit"],
    ["a weight of 0", { duct: round(20), layout: "custom", points: { lines: [{ depths: [0.5], weights: [0] }] } }, "points/lines/0/weights/0", "weights_do_not_fit"],
    ["a negative probe", { duct: round(20), layout: "log_linear", probe: { length: inches(-1) } }, "probe/length", "negative_length"],
    ["a negative site", { duct: round(20), layout: "log_linear", site: { upstream: inches(-1) } }, "site/upstream", "negative_length"],
  ])("%s", (_, input, path, code) => expect(faultsOf(input)).toEqual([{ path, code }]));

  it("says which layouts do for the shape", () => {
    expect(() => traversePlan({ duct: round(20), layout: "log_tchebycheff" })).toThrow(/`log_linear`, `equal_area`, `method_1`, `custom`/);
  });
});

describe("the working of a plan", () => {
  it("can be redone by hand: depth from fraction, dimension and wall", () => {
    const { working } = traversePlan({ duct: LINED, layout: "log_tchebycheff", working: true });
    const step = working!.find((one) => one.step === "Hole 1, point 2: insertion depth from the outside")!;
    expect(step.inputs.f!.value * step.inputs.L!.value + step.inputs.t!.value).toBeCloseTo(step.value.value, 12);
    expect(step.inputs.f!.value).toBeCloseTo(0.288, 12);
  });
  it("is absent where it was not asked for", () => expect(traversePlan({ duct: LINED, layout: "log_tchebycheff" }).working).toBeUndefined());
});
