/** A terminal in SI: airflows in m³/s. */
export interface TerminalFlow {
  design: number;
  measured: number;
}

/** Where a terminal stands among the others. */
export interface TerminalStanding {
  /** Measured over design. */
  ratio: number;
  /** Its ratio over the lowest, 1 at the key terminal. */
  overLowest: number;
  /** Place in the order of adjusting, 1 at the key terminal. */
  order: number;
  /** Airflow in m³/s if what the terminals carry together were shared in proportion to design. */
  proportionate: number;
}

/**
 * Proportional balancing: the terminal with the lowest ratio of measured to design airflow is the key terminal and stays open; the
 * others are throttled in the order of rising ratio until each has the ratio of those before it, and the fan brings all to
 * design together. Equal ratios keep the order they are given in.
 * @param terminals Design above 0, measured 0 or more, in m³/s.
 * @returns Standing of each, in the order given.
 * @example proportionalBalance([{ design: 1, measured: 0.9 }, { design: 1, measured: 1.1 }]).map(({ order }) => order) // [1, 2]
 * @see Common practice (proportional balancing), no source.
 */
export function proportionalBalance(terminals: readonly TerminalFlow[]): TerminalStanding[] {
  const ratios = terminals.map(({ design, measured }) => measured / design);
  const rising = ratios.map((_, index) => index).sort((first, second) => ratios[first]! - ratios[second]! || first - second);
  const order = new Map(rising.map((index, place) => [index, place + 1]));
  const lowest = ratios[rising[0]!]!;
  const share = totalOf(terminals, "measured") / totalOf(terminals, "design");
  return terminals.map(({ design }, index) => ({
    ratio: ratios[index]!,
    overLowest: lowest > 0 ? ratios[index]! / lowest : 1,
    order: order.get(index)!,
    proportionate: design * share,
  }));
}

/** Sum of the terminals' airflows in m³/s. */
export const totalOf = (terminals: readonly TerminalFlow[], which: keyof TerminalFlow): number => terminals.reduce((sum, terminal) => sum + terminal[which], 0);
