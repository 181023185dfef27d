import { ACTION, INK, MUTED } from "./colours";
import type { Style } from "./sheet";

/** One scale for the whole certificate, in points. */
export const TITLE: Style = { face: "strong", size: 17, colour: INK };
export const SUBTITLE: Style = { face: "strong", size: 10, colour: INK };
export const HEADING: Style = { face: "strong", size: 8, colour: ACTION };
export const LABEL: Style = { face: "text", size: 6.8, colour: MUTED };
export const BODY: Style = { face: "text", size: 7.6, colour: INK };
export const STRONG: Style = { face: "strong", size: 7.6, colour: INK };
export const FINE: Style = { face: "text", size: 6.4, colour: MUTED };
export const CODE: Style = { face: "figures", size: 6.8, colour: INK };

/** From one base line to the next. */
export const leading = ({ size }: Style): number => size * 1.26;

/** From the top of a line to its base line. */
export const ascent = ({ size }: Style): number => size * 0.96;
