/** Inside size of a duct as it is drawn, and what its wall and lining add on each side. */
export interface DuctOutline {
  shape: "rectangular" | "round" | "flat_oval";
  /** Inside, across the drawing; the diameter of a round duct, the major axis of a flat oval one. */
  width: number;
  /** Inside, down the drawing; the diameter again, or the minor axis. */
  height: number;
  wall: number;
  unit: string;
}

/**
 * @param left - Left edge of the inside, in the drawing's units; `top` likewise.
 * @param scale - Drawing units to one of the duct's.
 * @param grown - How far outside the inner face the outline runs, in the duct's unit: 0 for the inner face, `wall` for the outer.
 * @returns An SVG path. Round and flat oval ends are half circles.
 */
export function outlinePath({ shape, width, height }: DuctOutline, left: number, top: number, scale: number, grown: number): string {
  const x = left - grown * scale;
  const y = top - grown * scale;
  const w = (width + 2 * grown) * scale;
  const h = (height + 2 * grown) * scale;
  const r = shape === "rectangular" ? 0 : Math.min(w, h) / 2;
  return `M${x + r} ${y}h${w - 2 * r}a${r} ${r} 0 0 1 ${r} ${r}v${h - 2 * r}a${r} ${r} 0 0 1 ${-r} ${r}h${2 * r - w}a${r} ${r} 0 0 1 ${-r} ${-r}v${2 * r - h}a${r} ${r} 0 0 1 ${r} ${-r}z`;
}
