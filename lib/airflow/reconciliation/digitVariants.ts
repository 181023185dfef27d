import { writtenResolution } from "../uncertainty/readingInfluences";
import type { SlipName } from "./slip";

export const DIGIT_SLIPS = ["digit_changed", "digits_swapped", "digit_dropped", "digit_added", "decimal_moved"] as const satisfies SlipName[];
export type DigitSlip = (typeof DIGIT_SLIPS)[number];

/** Decimal places that numbers are written with: of all of them the most, as zeros at the end do not show in JSON. */
export const placesOf = (numbers: readonly (readonly (number | null)[])[]): number => Math.round(-Math.log10(writtenResolution(numbers)));

const POWERS = Array.from({ length: 40 }, (_, exponent) => Number(`1e${exponent}`));
const power = (exponent: number): number => POWERS[exponent]!;

/**
 * A number as its digits: `whole` without the decimal point, `places` of them after it, `length` in all. What a slip makes
 * of it is visited as a whole number, at the scale it is to be read at, so that the result is the number as it would be written.
 */
interface Digits {
  whole: number;
  places: number;
  length: number;
  visit: (slip: DigitSlip, whole: number, scale: number) => void;
}
const digitAt = (whole: number, place: number): number => Math.floor(whole / power(place)) % 10;

/**
 * Every number that one slip of the pen or the eye makes of a written one: a digit changed, two neighbours swapped, a
 * digit dropped, a digit doubled or inserted, the decimal point moved by one or two places. The decimal point stays
 * where it is unless it is what moved.
 * @param written Any number of up to 15 digits. @param places Decimal places it is written with, 0 to 12.
 * @param visit Called with each slip and the number it makes; never with the number itself.
 * @param low Numbers below may be passed over. @param high Numbers above may be passed over.
 * @example ((made: number[]) => { forEachDigitVariant(12, 0, (slip, used) => slip === "digits_swapped" && made.push(used)); return made; })([]) // [21]
 */
export function forEachDigitVariant(written: number, places: number, visit: (slip: DigitSlip, used: number) => void, low = -Infinity, high = Infinity): void {
  const whole = Math.round(Math.abs(written) * power(places));
  const sign = written < 0 ? -1 : 1;
  let length = Math.max(1, places);
  while (whole >= power(length)) length += 1;
  const digits: Digits = {
    whole, places, length,
    visit: (slip, value, scale) => {
      const used = value / power(scale);
      if (used !== Math.abs(written)) visit(slip, sign * used);
    },
  };
  changed(digits);
  swapped(digits);
  const first = power(length - 1) / power(places);
  if (sign < 0 || places > 0 || low < first) dropped(digits);
  if (sign < 0 || high >= 10 * first) addedBeforePoint(digits);
  addedAfterPoint(digits);
  for (const shift of [1, 2]) {
    digits.visit("decimal_moved", whole * power(shift), places);
    digits.visit("decimal_moved", whole, places + shift);
  }
}

/** Nobody writes 094: the first digit of a whole part of several does not become 0. */
const leads = ({ places, length }: Digits, place: number): boolean => place === length - 1 && place >= places && length > 1;

function changed(digits: Digits): void {
  const { whole, places, length, visit } = digits;
  for (let place = 0; place < length; place += 1) {
    const digit = digitAt(whole, place);
    for (let other = leads(digits, place) ? 1 : 0; other <= 9; other += 1) {
      if (other !== digit) visit("digit_changed", whole + (other - digit) * power(place), places);
    }
  }
}

function swapped(digits: Digits): void {
  const { whole, places, length, visit } = digits;
  for (let place = 0; place + 1 < length; place += 1) {
    const lower = digitAt(whole, place);
    const upper = digitAt(whole, place + 1);
    if (lower === upper || (lower === 0 && leads(digits, place + 1))) continue;
    visit("digits_swapped", whole + (upper - lower) * power(place) + (lower - upper) * power(place + 1), places);
  }
}

function dropped({ whole, places, length, visit }: Digits): void {
  for (let place = 0; place < length && length > 1; place += 1) {
    // Of two equal neighbours either one may be dropped, to the same effect.
    if (place + 1 < length && place + 1 !== places && digitAt(whole, place) === digitAt(whole, place + 1)) continue;
    const above = Math.floor(whole / power(place + 1));
    const below = whole % power(place);
    visit("digit_dropped", place >= places ? above * power(place) + below : above * power(place + 1) + below * 10, places);
  }
}

function addedBeforePoint({ whole, places, length, visit }: Digits): void {
  for (let place = places; place <= length; place += 1) insert(whole, place, place === length, places, visit);
}

/** What follows the new digit moves one place down, so these come at one more decimal place. */
function addedAfterPoint({ whole, places, visit }: Digits): void {
  for (let place = 0; place <= places && places > 0; place += 1) insert(whole, place, place === places, places + 1, visit);
}

/** Puts each digit in above `place`; beside an equal digit the same number would come twice. */
function insert(whole: number, place: number, isHighest: boolean, scale: number, visit: Digits["visit"]): void {
  const neighbour = isHighest ? -1 : digitAt(whole, place);
  const around = Math.floor(whole / power(place)) * power(place + 1) + (whole % power(place));
  for (let digit = 0; digit <= 9; digit += 1) {
    if (digit !== neighbour) visit("digit_added", around + digit * power(place), scale);
  }
}
