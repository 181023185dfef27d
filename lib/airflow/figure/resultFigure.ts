import type { Face } from "../layout/line";
import type { UnitSystem } from "../units/units";
import { heading, note, stack, type Block } from "./blocks";
import { colourScale } from "./colourScale";
import { DIMENSION_ROOM, insideDimension } from "./dimensions";
import { ductShape } from "./ductShape";
import { frameIn, outside, toDrawing, type Frame, type Margins } from "./frame";
import { HOLE_ROOM, holeMarks } from "./holes";
import { insideWords, tape } from "./measures";
import { placeLabels, type PlacedLabel } from "./placeLabels";
import { pointMark, pointRadius, RING_GAP } from "./pointMark";
import { readingModel, type ReadingFigureInput, type ReadingModel } from "./readingModel";
import { CARD, drawing, INK, RUST, text } from "./svg";
import { LAYOUT_WORDS } from "./words";
import { readingWords, UNIT_SYMBOLS, writeReadings } from "./writeReadings";

export interface ResultFigureInput extends ReadingFigureInput {
  /** Units of the dimensions on the drawing; the readings keep their own. */
  units?: UnitSystem;
  /** Names the drawing; "Traverse" when left out. */
  title?: string;
  /** Width in drawing units, 320 or more. Letters keep their size: 720 fills a page, 360 a telephone. */
  width?: number;
}

const LEAST_WIDTH = 320;
/** Sizes of figures and points, the wanted ones first. */
const TRIES = [{ size: 11, radius: 6 }, { size: 11, radius: 4.5 }, { size: 9.5, radius: 4.5 }, { size: 9.5, radius: 3.5 }, { size: 8.5, radius: 3 }];

/**
 * A traverse as a drawing to scale: where each reading was taken, what it was, coloured by velocity, suspected slips ringed.
 * It needs no more than the duct and the readings.
 * @returns An SVG document.
 * @throws {AirflowInputError} A duct that cannot be.
 */
export function resultFigure({ units = "ip", title = "Traverse", width = 720, ...input }: ResultFigureInput): string {
  const model = readingModel(input);
  const room = Math.max(LEAST_WIDTH, width);
  const subtitle = [insideWords(model.inside, units), ...(input.layout ? [LAYOUT_WORDS[input.layout]] : []), countWords(model)].join(", ");
  const words = writeReadings(model.readings.map(({ reading }) => reading));
  const section = crossSection(model, words, input.enterFrom ?? "top", units, room);
  const notes = notesOn(model, section.unwritten, input.readings.unit);
  const { svg, height } = stack([heading(title, subtitle, room - 2), section, colourScale(model, room), ...notes.map((one) => note(one, room - 2))], 10);
  return drawing({ width: room, height: height + 4 }, { title: `${title}: ${subtitle}`, description: readingWords(model, words, input.readings.unit) }, svg);
}

function countWords({ readings }: ReadingModel): string {
  const missing = readings.filter(({ reading }) => reading === null).length;
  return `${readings.length - missing} readings${missing > 0 ? `, ${missing} not read` : ""}`;
}

function notesOn({ byRule, readings }: ReadingModel, unwritten: number, unit: string | undefined): string[] {
  const slips = readings.filter(({ suspected }) => suspected).length;
  return [
    `Readings${unit ? ` in ${UNIT_SYMBOLS[unit] ?? unit}` : ""}, seen in the direction of the flow.`,
    ...(slips > 0 ? [`Ringed: ${slips === 1 ? "a reading that looks" : `${slips} readings that look`} like a slip.`] : []),
    ...(readings.some(({ reading }) => reading === null) ? ["Crossed out: could not be read."] : []),
    ...(byRule ? [] : ["No rule has this many points on its lines: they are drawn evenly spread, and the places are a sketch."]),
    ...(unwritten > 0 ? [`${unwritten} readings are not written for want of room.`] : []),
  ];
}

const OPPOSITE: Record<Face, Face> = { top: "bottom", bottom: "top", left: "right", right: "left" };

function crossSection(model: ReadingModel, words: readonly (string | null)[], entered: Face, units: UnitSystem, width: number): Block & { unwritten: number } {
  const upright = entered === "left" || entered === "right";
  const across: Face = upright ? "bottom" : OPPOSITE[entered];
  const down: Face = upright ? OPPOSITE[entered] : "left";
  // One diameter says all of a pipe, and its second hole may stand where the other dimension would.
  const measured = model.inside.shape === "round" ? [OPPOSITE[entered]] : [across, down];
  const margins: Margins = { top: 8, right: 8, bottom: 8, left: 8 };
  for (const side of measured) margins[side] = DIMENSION_ROOM;
  for (const { direction } of model.lines) {
    const faces: [Face, number][] = [["top", -direction.y], ["bottom", direction.y], ["right", -direction.x], ["left", direction.x]];
    for (const [face, toward] of faces) if (toward > 0.1) margins[face] = Math.max(margins[face], HOLE_ROOM);
  }
  const frame = frameIn(model, width, Math.min(420, width), margins);
  const written = bestLabels(frame, model, words);
  const svg = [
    ductShape(frame),
    holeMarks(frame, model.lines),
    ...model.readings.map((reading) => pointMark(toDrawing(frame, reading), reading, model.range, written.radius)),
    ...written.labels.map((label, index) => (label ? readingText(label, written.size, model.readings[index]!.suspected) : "")),
    ...measured.map((side) => insideDimension(frame, side, `${tape((side === "left" || side === "right" ? frame.height : frame.width) / frame.scale, units)} inside`)),
  ];
  const unwritten = words.filter((word, index) => word !== null && !written.labels[index]).length;
  return { svg: svg.join(""), height: outside(frame).bottom + margins.bottom, unwritten };
}

interface Written {
  labels: (PlacedLabel | null)[];
  size: number;
  radius: number;
}

/**
 * The readings as large as they go with each below its point. Where they do not all go, points and figures shrink as long
 * as that brings more of them in or to their place.
 */
function bestLabels(frame: Frame, { readings }: ReadingModel, words: readonly (string | null)[]): Written {
  const most = pointRadius(frame, readings);
  const attempts = TRIES.map(({ size, radius: wanted }, index) => {
    const radius = Math.min(most, wanted);
    const spots = readings.map((reading, one) => ({ words: words[one] ?? "", at: toDrawing(frame, reading), clear: radius + (reading.suspected ? RING_GAP : 0) }));
    const labels = placeLabels(frame, spots, size);
    const missing = labels.filter((label) => label === null).length;
    const moved = labels.filter((label) => label?.moved).length;
    return { labels, size, radius, cost: 100 * missing + moved + (index * readings.length) / 10 };
  });
  return attempts.reduce((best, one) => (one.cost < best.cost ? one : best));
}

const readingText = ({ x, y, words }: { x: number; y: number; words: string }, size: number, suspected: boolean): string =>
  words === "" ? "" : text(words, { x, y, "text-anchor": "middle", "font-size": size, fill: suspected ? RUST : INK, "font-weight": suspected ? 600 : undefined, stroke: CARD, "stroke-width": 2.5, "paint-order": "stroke" });
