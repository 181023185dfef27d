/** Name of the cookie that keeps the reader's choice, so that the first byte of a page already knows it. */
export const THEME_COOKIE = "averduct_theme";

export type Theme = "light" | "dark";

/** The choice in a cookie's value; undefined where the system decides. */
export const themeFrom = (value: string | undefined): Theme | undefined => (value === "light" || value === "dark" ? value : undefined);
