export function say(line: string): void;
export class CannotStart extends Error {}
export function runCommand(work: () => Promise<void>): Promise<void>;
