import type { UnitSystem } from "../units/units";
import { frameIn, toDrawing } from "./frame";
import { ductShape } from "./ductShape";
import { insideWords } from "./measures";
import { pointMark, pointRadius } from "./pointMark";
import { readingModel, type ReadingFigureInput } from "./readingModel";
import { drawing } from "./svg";

const SIZE = { width: 96, height: 72 };
const MARGIN = 3;

/**
 * A traverse no larger than a stamp, for lists: the duct and its points, coloured by velocity, suspected slips ringed.
 * @returns An SVG document of 96 × 72.
 * @throws {AirflowInputError} A duct that cannot be.
 */
export function thumbnail({ units = "ip", ...input }: ReadingFigureInput & { units?: UnitSystem }): string {
  const model = readingModel(input);
  const margins = { top: MARGIN, right: MARGIN, bottom: MARGIN, left: MARGIN };
  const frame = frameIn(model, SIZE.width, SIZE.height - 2 * MARGIN, margins);
  const middled = { ...frame, top: (SIZE.height - frame.height) / 2 };
  const radius = Math.min(3.5, pointRadius(middled, model.readings));
  const words = `${insideWords(model.inside, units)}, ${model.readings.length} points`;
  return drawing(SIZE, { title: words, description: words }, ductShape(middled), ...model.readings.map((reading) => pointMark(toDrawing(middled, reading), reading, model.range, radius)));
}
