import { wallDistance } from "../layout/chord";
import type { Place } from "../layout/line";
import { toDuct, type Frame } from "./frame";
import { monoWidth } from "./svg";

/** Words that belong to a spot in the drawing. */
export interface Label {
  words: string;
  at: Place;
  /** How far round the spot nothing may be written. */
  clear: number;
}

/** Where words go: their middle and their foot. */
export interface PlacedLabel extends Place {
  words: string;
  /** Whether it stands elsewhere than below its spot. */
  moved: boolean;
}

interface Box {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** Height of figures against the size of the face. */
const CAP = 0.72;
const GAP = 2;

/**
 * Places for labels inside the duct that cross neither each other, nor a spot, nor the wall: below the spot if there is
 * room, else above, to the right, to the left, at a slant. A label without room anywhere is null.
 */
export function placeLabels(frame: Frame, labels: readonly Label[], size: number): (PlacedLabel | null)[] {
  const taken: Box[] = labels.map(({ at, clear }) => around(at, clear));
  return labels.map(({ words, at, clear }) => {
    const [w, h] = [monoWidth(words, size), size * CAP];
    const beside = clear + GAP + w / 2;
    const candidates: Place[] = [
      { x: at.x, y: at.y + clear + GAP + h },
      { x: at.x, y: at.y - clear - GAP },
      { x: at.x + beside, y: at.y + h / 2 },
      { x: at.x - beside, y: at.y + h / 2 },
      ...[-beside, beside].flatMap((aside) => [{ x: at.x + aside, y: at.y - clear }, { x: at.x + aside, y: at.y + clear + h }]),
    ];
    for (const [index, place] of candidates.entries()) {
      const box = { left: place.x - w / 2, right: place.x + w / 2, top: place.y - h, bottom: place.y };
      if (!isInside(frame, box) || taken.some((other) => cross(box, other))) continue;
      taken.push({ left: box.left - GAP, right: box.right + GAP, top: box.top - GAP / 2, bottom: box.bottom + GAP / 2 });
      return { ...place, words, moved: index > 0 };
    }
    return null;
  });
}

const around = ({ x, y }: Place, reach: number): Box => ({ left: x - reach, right: x + reach, top: y - reach, bottom: y + reach });

const cross = (one: Box, other: Box): boolean => one.left < other.right && other.left < one.right && one.top < other.bottom && other.top < one.bottom;

/** Whether all of a box stands inside the duct, a little off its wall. */
function isInside(frame: Frame, { left, right, top, bottom }: Box): boolean {
  const corners = [{ x: left, y: top }, { x: right, y: top }, { x: left, y: bottom }, { x: right, y: bottom }];
  return corners.every((corner) => wallDistance(frame.inside, toDuct(frame, corner)) * frame.scale > GAP);
}
