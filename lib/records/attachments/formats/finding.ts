/** What is wrong with a file that begins as one of its format does; null where nothing is. */
export type Finding = { code: "file_damaged" | "data_after_end"; detail: string } | null;

export const damaged = (detail: string): Finding => ({ code: "file_damaged", detail });
export const dataAfterEnd = (detail: string): Finding => ({ code: "data_after_end", detail });
