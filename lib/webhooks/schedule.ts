const MINUTE = 60;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;

/** Pauses between attempts, in seconds: 72 h and 26 min in all, so that the last comes when three days have passed. */
export const RETRY_PAUSES_S = [10, MINUTE, 5 * MINUTE, 20 * MINUTE, HOUR, 3 * HOUR, 6 * HOUR, 12 * HOUR, 24 * HOUR, 26 * HOUR] as const;

/** An endpoint to which nothing has got through for this long is disabled. */
export const PATIENCE_S = 3 * DAY;

/** Of the pause: what failed together is not tried again together. Only ever longer, so that the three days are kept. */
const JITTER = 0.1;

/**
 * How long to wait after a failed attempt, in seconds; null after the last.
 * @param attempts How many there have been, 1 or more.
 */
export function pauseAfter(attempts: number, random: () => number = Math.random): number | null {
  const pause = RETRY_PAUSES_S[attempts - 1];
  return pause === undefined ? null : pause * (1 + JITTER * random());
}
