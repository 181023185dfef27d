/**
 * What to heed before and after drilling. Hazards of the trade, common practice, no source; they do not replace the site's
 * safety plan or local codes.
 */
export const CAUTIONS: readonly string[] = [
  "Before drilling, find wiring, refrigerant lines and coils near the holes.",
  "Old insulation or duct wrap may contain asbestos: stop, and have it tested before drilling.",
  "Lock out and tag out the fan before reaching into the duct.",
  "Heat, ladders and confined spaces: follow the site's safety plan.",
  "Exhaust from laboratories, kitchens or processes can be toxic, hot or flammable: find out what the duct carries before opening it.",
  "Seal every hole with a plug or a tape listed for the duct's material.",
  "Results support, and do not replace, local codes, the project specification and licensed or certified practice. Smoke control and laboratory containment need the responsible professional.",
];
