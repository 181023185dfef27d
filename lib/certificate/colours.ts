/** The colours of paper; a certificate has no dark form. */
export const INK = "#18211f";
export const MUTED = "#55615d";
export const RULE = "#cbd0cc";
export const PAPER = "#f6f5f1";
export const WHITE = "#ffffff";
export const ACTION = "#1e6b62";
export const ACTION_WASH = "#d9e9e5";
export const RUST = "#b4431f";
export const RUST_WASH = "#f8e9e3";
export const OCHRE = "#9a6b00";
export const OCHRE_WASH = "#f6edd9";
