import { Status } from "@/app/_components/layout/Status";

const SOON_DAYS = 30;
const DAY_MS = 86_400_000;

const dayFromToday = (days: number): string => new Date(Date.now() + days * DAY_MS).toISOString().slice(0, 10);

/** Whether an instrument is in calibration today, and until when. */
export function CalibrationStanding({ due }: { due: string | null }) {
  if (due === null) return <Status standing="failure">Not calibrated</Status>;
  if (due < dayFromToday(0)) return <Status standing="failure">Was due {due}</Status>;
  return due <= dayFromToday(SOON_DAYS) ? <Status standing="caution">Due soon, {due}</Status> : <Status standing="good">Until {due}</Status>;
}
