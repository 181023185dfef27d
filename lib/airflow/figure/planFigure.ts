import { CAUTIONS } from "../layout/cautions";
import { ANGLE_OF } from "../layout/chord";
import type { Face, TraverseLine } from "../layout/line";
import { planTraverse, type PlanInput, type TraversePlan } from "../layout/plan";
import type { UnitSystem } from "../units/units";
import { heading, note, stack, type Block } from "./blocks";
import { arcDimensions, ARC_ROOM } from "./arcDimensions";
import { DIMENSION_ROOM, insideDimension, runningDimension, runningRoom, type Station } from "./dimensions";
import { ductShape } from "./ductShape";
import { frameIn, outside, toDrawing, type Frame, type Margins } from "./frame";
import { HOLE_ROOM, holeMarks } from "./holes";
import { insideWords, tape, TAPE_WORDS, tapeWithUnit } from "./measures";
import { numberedPoints } from "./numberedPoints";
import { schedule } from "./schedule";
import { drawing, SANS, text } from "./svg";
import { LAYOUT_WORDS, planWords } from "./words";

export interface PlanFigureInput extends PlanInput {
  units?: UnitSystem;
  /** Names the drawing, e.g. the system and the place; "Traverse plan" when left out. */
  title?: string;
  /** Width in drawing units, 320 or more. Letters keep their size, so this is how much room they have: 720 fills a page, 360 a telephone. */
  width?: number;
  /** Whether the cautions stand below, as a sheet for the site needs them; true when left out. */
  cautions?: boolean;
}

const LEAST_WIDTH = 320;
/** The running dimension of the holes stands off beyond their numbers. */
const HOLES_OFF = HOLE_ROOM + 4;

/**
 * A plan as a drawing to scale: cross-section with wall and lining, holes and depths with dimension lines, points in the
 * order to read them, and below it a table with the marks for the probe and a blank box for each reading.
 * @returns An SVG document.
 * @throws {AirflowInputError} As `traversePlan`.
 */
export function planFigure({ units = "ip", title = "Traverse plan", width = 720, cautions = true, ...input }: PlanFigureInput): string {
  const plan = planTraverse(input);
  const room = Math.max(LEAST_WIDTH, width);
  const subtitle = `${insideWords(plan.inside, units)}, ${LAYOUT_WORDS[plan.layout]}, ${plan.points} points`;
  const blocks = [
    heading(title, subtitle, room - 2),
    crossSection(plan, input.enterFrom ?? "top", units, room),
    note(`Seen in the direction of the flow. Measures on the drawing are from the outside faces, in ${TAPE_WORDS[units]}: where to drill, and where to mark the probe. It must reach ${tapeWithUnit(plan.probeLength, units)}. Layout: ${plan.source}.`, room - 2),
    schedule(plan, units, room - 2),
    ...(cautions ? [cautionList(room - 2)] : []),
  ];
  const { svg, height } = stack(blocks, 16);
  return drawing({ width: room, height: height + 4 }, { title: `${title}: ${subtitle}`, description: planWords(plan.lines, units) }, svg);
}

function cautionList(width: number): Block {
  const head: Block = { svg: text("Before drilling and after", { y: 12, "font-family": SANS, "font-size": 12, "font-weight": 600 }), height: 15 };
  return stack([head, ...CAUTIONS.map((caution) => note(caution, width))], 3);
}

const OPPOSITE: Record<Face, Face> = { top: "bottom", bottom: "top", left: "right", right: "left" };
const ANTICLOCKWISE: Record<Face, Face> = { top: "left", left: "bottom", bottom: "right", right: "top" };
const isUpright = (face: Face): boolean => face === "left" || face === "right";

/** Which side carries which dimension. */
interface Sides {
  holes: Face;
  depths: Face;
  inside: Face[];
}

function sidesFor({ inside }: TraversePlan, entered: Face): Sides {
  // The second hole of a round duct is on the clockwise side; depths go on the other.
  if (inside.shape === "round") return { holes: entered, depths: ANTICLOCKWISE[entered], inside: [OPPOSITE[entered]] };
  const depths: Face = isUpright(entered) ? "bottom" : "right";
  return { holes: entered, depths, inside: [OPPOSITE[entered], OPPOSITE[depths]] };
}

function crossSection(plan: TraversePlan, entered: Face, system: UnitSystem, width: number): Block {
  const sides = sidesFor(plan, entered);
  const flat = plan.lines.filter(({ angle }) => angle === null);
  const measured = firstSquareTo(plan.lines, entered);
  const depthWords = (measured?.points ?? []).map(({ depth }) => tape(measured!.wall + depth, system));
  const holeWords = flat.map(({ alongOutside }) => tape(alongOutside, system));
  const build = (margins: Margins) => frameIn({ inside: plan.inside, wall: plan.wall }, width, Math.min(380, width), margins);
  // Margins depend on whether figures are turned, which depends on the scale, which depends on the margins: twice settles it.
  let frame = build(marginsFor(plan, sides, [], []));
  frame = build(marginsFor(plan, sides, holeStations(frame, sides.holes, flat, holeWords), depthStations(frame, sides.depths, measured, depthWords)));
  const holes = holeStations(frame, sides.holes, flat, holeWords);
  const depths = depthStations(frame, sides.depths, measured, depthWords);
  const edges = outside(frame);
  const svg = [
    ductShape(frame),
    holeMarks(frame, plan.lines),
    numberedPoints(frame, plan.lines),
    ...sides.inside.map((side) => insideDimension(frame, side, `${tape(isUpright(side) ? frame.height / frame.scale : frame.width / frame.scale, system)} inside`)),
    holes.length > 0 ? runningDimension(frame, { side: sides.holes, origin: isUpright(sides.holes) ? edges.top : edges.left, stations: holes, off: HOLES_OFF }) : "",
    depths.length > 0 ? runningDimension(frame, { side: sides.depths, origin: edges[entered], stations: depths, off: depthsOff(plan) }) : "",
    plan.inside.shape === "round" ? arcDimensions(frame, plan.lines, system) : "",
  ];
  return { svg: svg.join(""), height: edges.bottom + marginsFor(plan, sides, holes, depths).bottom };
}

/** The first line that goes straight in from the face, whose depths can be measured along a side. */
const firstSquareTo = (lines: readonly TraverseLine[], face: Face): TraverseLine | undefined => lines.find(({ angle }) => angle === null || angle === ANGLE_OF[face]);

const depthsOff = ({ inside }: TraversePlan): number => (inside.shape === "rectangular" ? 10 : HOLE_ROOM);

function holeStations(frame: Frame, side: Face, lines: readonly TraverseLine[], words: readonly string[]): Station[] {
  return lines.map((line, index) => ({ along: toDrawing(frame, line.start)[isUpright(side) ? "y" : "x"], words: words[index]! }));
}

function depthStations(frame: Frame, side: Face, line: TraverseLine | undefined, words: readonly string[]): Station[] {
  return (line?.points ?? []).map((point, index) => ({ along: toDrawing(frame, point)[isUpright(side) ? "y" : "x"], words: words[index]! }));
}

function marginsFor(plan: TraversePlan, sides: Sides, holes: readonly Station[], depths: readonly Station[]): Margins {
  const margins: Margins = { top: 8, right: 8, bottom: 8, left: 8 };
  const widen = (side: Face, room: number): void => {
    margins[side] = Math.max(margins[side], room);
  };
  if (plan.inside.shape === "round") for (const side of ["top", "right", "bottom", "left"] as const) widen(side, plan.lines.length > 1 ? ARC_ROOM : HOLE_ROOM);
  for (const side of sides.inside) widen(side, DIMENSION_ROOM);
  widen(sides.holes, HOLES_OFF + 6 + (holes.length > 0 ? runningRoom(holes, isUpright(sides.holes)) : 0));
  if (depths.length > 0) widen(sides.depths, depthsOff(plan) + 6 + runningRoom(depths, isUpright(sides.depths)));
  return margins;
}
