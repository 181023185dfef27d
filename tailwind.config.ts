import type { Config } from "tailwindcss";

/**
 * Names for the tokens of app/globals.css, which holds their values for both themes.
 * Only these colours, sizes and corners exist: Tailwind's own scales are replaced, not extended.
 */
export default {
  theme: {
    colors: {
      transparent: "transparent",
      current: "currentColor",
      paper: "var(--paper)",
      card: "var(--card)",
      inset: "var(--inset)",
      ink: "var(--ink)",
      muted: "var(--muted)",
      edge: "var(--edge)",
      rule: "var(--rule)",
      action: "var(--action)",
      "action-strong": "var(--action-strong)",
      "action-wash": "var(--action-wash)",
      "on-action": "var(--on-action)",
      rust: "var(--rust)",
      "rust-strong": "var(--rust-strong)",
      "rust-wash": "var(--rust-wash)",
      "on-rust": "var(--on-rust)",
      ochre: "var(--ochre)",
      "ochre-wash": "var(--ochre-wash)",
    },
    fontFamily: {
      sans: ["Instrument Sans Variable", "system-ui", "sans-serif"],
      mono: ["Spline Sans Mono", "ui-monospace", "monospace"],
    },
    /** One scale, a minor third between the larger steps. */
    fontSize: {
      fine: ["0.75rem", { lineHeight: "1rem" }],
      small: ["0.8125rem", { lineHeight: "1.1875rem" }],
      base: ["0.9375rem", { lineHeight: "1.4375rem" }],
      lead: ["1.0625rem", { lineHeight: "1.5625rem" }],
      title: ["1.25rem", { lineHeight: "1.625rem" }],
      head: ["1.5625rem", { lineHeight: "1.9375rem" }],
      figure: ["2rem", { lineHeight: "2.25rem" }],
    },
    borderRadius: { none: "0", sheet: "2px", control: "3px", full: "9999px" },
    boxShadow: { none: "none" },
  },
} satisfies Config;
