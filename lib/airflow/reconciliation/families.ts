import type { Case } from "./case";
import type { Hypothesis, SlipFamily } from "./hypothesis";
import { omissionAndRepetition, wrongCount } from "./slips/counting";
import { areaConversion, radiusForDiameter, wallSlips } from "./slips/ductSlips";
import { dimensionDigits } from "./slips/dimensionDigits";
import { figureCoarse, figureDigits, figureUnit } from "./slips/figureSlips";
import { readingDigits } from "./slips/readingDigits";
import { densityIgnored, pressuresAveraged, readingUnit } from "./slips/velocitySlips";
import type { Worksheet } from "./worksheet";

/** Slips in the method or in a figure: few, whatever the number of readings. */
const METHOD_FAMILIES: SlipFamily[] = [wallSlips, radiusForDiameter, areaConversion, pressuresAveraged, densityIgnored, readingUnit, wrongCount, figureUnit, figureDigits, figureCoarse, dimensionDigits];
/** Slips in a single reading. They come last on a worksheet, since a change of method touches every reading. */
const READING_FAMILIES: SlipFamily[] = [omissionAndRepetition, readingDigits];

export const methodSlips = (one: Case, sheet: Worksheet): Hypothesis[] => METHOD_FAMILIES.flatMap((family) => family(one, sheet));
export const readingSlips = (one: Case, sheet: Worksheet): Hypothesis[] => READING_FAMILIES.flatMap((family) => family(one, sheet));
export const singleSlips = (one: Case, sheet: Worksheet): Hypothesis[] => [...methodSlips(one, sheet), ...readingSlips(one, sheet)];
