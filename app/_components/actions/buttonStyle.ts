/** `primary`: the one thing a page is for. `plain`: everything else. `danger`: what destroys. */
export type ButtonVariant = "primary" | "plain" | "danger";
export type ButtonSize = "normal" | "small";

const BASE =
  "relative inline-flex items-center justify-center gap-2 border rounded-control font-medium text-center select-none " +
  "disabled:cursor-not-allowed aria-disabled:cursor-progress disabled:border-rule disabled:bg-inset disabled:text-muted";

const VARIANTS: Record<ButtonVariant, string> = {
  primary: "border-action bg-action text-on-action enabled:hover:bg-action-strong [a&]:hover:bg-action-strong",
  plain: "border-edge bg-card text-ink enabled:hover:border-ink enabled:hover:bg-inset [a&]:hover:border-ink [a&]:hover:bg-inset",
  danger: "border-rust bg-card text-rust enabled:hover:bg-rust enabled:hover:text-on-rust [a&]:hover:bg-rust [a&]:hover:text-on-rust",
};

const SIZES: Record<ButtonSize, string> = {
  normal: "min-h-9 px-3.5 py-1.5 text-base",
  small: "min-h-7 px-2.5 py-0.5 text-small",
};

/** Classes shared by buttons and by links that look like them. */
export const buttonStyle = (variant: ButtonVariant, size: ButtonSize, extra = ""): string =>
  `${BASE} ${VARIANTS[variant]} ${SIZES[size]} ${extra}`;
