import type { InsideDuct } from "../duct/insideDuct";
import type { LayoutRule } from "../types";

const METHOD_1 = "40 CFR Part 60, Appendix A-1, Method 1";

/** Where the positions of a rule in a shape of duct come from, and how surely. */
export function ruleSource(layout: LayoutRule, shape: InsideDuct["shape"]): string {
  if (shape === "flat_oval" && layout !== "custom") return "Flat oval as a rectangle and two half circles: common practice, no source";
  switch (layout) {
    case "log_tchebycheff":
      return "ISO 3966; ASHRAE 111 (from memory, reproduced by derivation)";
    case "log_linear":
      return "ISO 3966; ISO 5802 (4 and 10 points from memory, reproduced by derivation)";
    case "equal_area":
      return shape === "round" ? `Equal annuli: the closed form of ${METHOD_1}, Table 1-2; counts: common practice, no source` : "Equal cells, at most 6 in between centres, 16 to 64 in all: common practice, no source";
    case "method_1":
      return `${METHOD_1} (counts and wall limits from memory)`;
    case "custom":
      return "As given";
  }
}
