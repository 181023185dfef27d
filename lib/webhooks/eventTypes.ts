/** What happens to records that a partner application can be told of. */
export const EVENT_TYPES = ["traverse.issued", "traverse.voided", "instrument.calibration_due", "quota.reached"] as const;
export type EventType = (typeof EVENT_TYPES)[number];
