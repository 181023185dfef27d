import type { Knex } from "knex";
import { LOG_TCHEBYCHEFF } from "@/lib/airflow/layout/logTchebycheff";
import type { Air, Duct, LayoutRule, Readings } from "@/lib/airflow/types";
import { addCalibration } from "@/lib/records/calibrations";
import type { RecordContext } from "@/lib/records/context";
import { createInstrument } from "@/lib/records/instruments";
import { createProject } from "@/lib/records/projects";
import type { Realm } from "@/lib/records/realm";
import { changeTraverse, createTraverse } from "@/lib/records/traverses/drafts";
import { issueTraverse, reviseTraverse, voidTraverse } from "@/lib/records/traverses/issue";

/** All invented: the scenario of the product's description. */

interface Plane {
  system: string;
  location: string;
  duct: Duct;
  layout: LayoutRule;
  /** Readings a line, lines. */
  grid: [number, number];
  kind: Readings["kind"];
  /** Velocity at the middle, ft/min. */
  middle: number;
  /** Design airflow, ft³/min. */
  design: number;
  project: 0 | 1;
  instrument: 0 | 1 | 2 | 3;
}

const inches = (value: number) => ({ value, unit: "in" as const });
const rectangular = (width: number, height: number, lining?: number): Duct => ({
  shape: "rectangular", measured: lining ? "outside" : "inside", width: inches(width + 2 * (lining ?? 0)), height: inches(height + 2 * (lining ?? 0)), ...(lining && { wall: { lining: inches(lining) } }),
});
const round = (diameter: number): Duct => ({ shape: "round", measured: "inside", diameter: inches(diameter) });

const PLANES: Plane[] = [
  { system: "AHU-1", location: "Supply main, north riser", duct: rectangular(24, 16, 1), layout: "log_tchebycheff", grid: [5, 5], kind: "velocity_pressure", middle: 1_060, design: 2_600, project: 0, instrument: 0 },
  { system: "AHU-1", location: "Return main, plant room", duct: rectangular(28, 18), layout: "log_tchebycheff", grid: [5, 5], kind: "velocity_pressure", middle: 780, design: 2_350, project: 0, instrument: 0 },
  { system: "AHU-1", location: "Branch to reading room", duct: rectangular(18, 12), layout: "log_tchebycheff", grid: [5, 5], kind: "velocity_pressure", middle: 1_120, design: 1_450, project: 0, instrument: 0 },
  { system: "AHU-2", location: "Supply main, roof", duct: rectangular(32, 14), layout: "log_tchebycheff", grid: [6, 5], kind: "velocity", middle: 930, design: 2_500, project: 0, instrument: 1 },
  { system: "AHU-2", location: "Branch to children's library", duct: round(16), layout: "log_linear", grid: [2, 10], kind: "velocity", middle: 980, design: 1_150, project: 0, instrument: 1 },
  { system: "EF-3", location: "Exhaust, washrooms", duct: round(14), layout: "log_linear", grid: [2, 6], kind: "velocity", middle: 1_020, design: 960, project: 0, instrument: 2 },
  { system: "AHU-4", location: "Supply to treatment rooms", duct: { shape: "flat_oval", measured: "inside", major: inches(26), minor: inches(12) }, layout: "equal_area", grid: [4, 4], kind: "velocity_pressure", middle: 1_180, design: 2_050, project: 1, instrument: 0 },
  { system: "EF-7", location: "Exhaust, sluice room", duct: round(10), layout: "log_linear", grid: [2, 6], kind: "velocity", middle: 860, design: 430, project: 1, instrument: 3 },
];

/** Library at 1,640 ft. */
const AIR: Air = { dryBulb: { value: 58, unit: "degF" }, relativeHumidity: { value: 60, unit: "percent" }, altitude: { value: 1_640, unit: "ft" } };

/** A generator of the same numbers at every seeding. */
function repeatable(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

/** Readings over a profile that falls off towards the walls, a little askew and unsteady as in any duct. */
function readingsOf({ kind, grid: [lineCount, count], middle, layout }: Plane, random: () => number): Readings {
  const skew = (random() - 0.5) * 0.12;
  const place = (index: number, of: number): number => (layout === "log_tchebycheff" ? LOG_TCHEBYCHEFF[of]![index]! : (index + 0.5) / of);
  const lines = Array.from({ length: lineCount }, (_, line) =>
    Array.from({ length: count }, (_, point) => {
      const [across, along] = [lineCount === 2 ? 0.5 : place(line, lineCount), place(point, count)];
      const wall = Math.min(along, 1 - along, lineCount === 2 ? 0.5 : across, 1 - across);
      const velocity = middle * (2 * wall) ** (1 / 7) * (1 + skew * (across - 0.5)) * (0.985 + 0.03 * random());
      return kind === "velocity" ? Math.round(velocity) : Math.round(1_000 * (velocity / 4_005) ** 2) / 1_000;
    }),
  );
  return kind === "velocity" ? { kind, unit: "ft/min", lines } : { kind, unit: "in_wg", lines };
}

/** What becomes of each of the thirty; the plane goes round the list above. */
const STORIES = [
  "issued", "issued", "superseded", "issued", "issued", "issued", "issued", "draft_uncalibrated",
  "issued", "void", "issued", "superseded", "issued", "issued", "draft_unsealed", "issued_waived",
  "draft_slip", "issued", "issued", "issued_low", "issued", "issued", "draft_begun", "issued_waived",
  "issued", "issued_low", "draft_slip", "draft_plan",
] as const;
type Story = (typeof STORIES)[number];

/** Two projects, four instruments, thirty traverses in all states. */
export async function seedRecords(db: Knex, realm: Realm, userId: string): Promise<void> {
  const context: RecordContext = { db, realm, by: { userId } };
  const projects = [
    await createProject(context, { name: "Marram Point Library", number: "26-114", location: "Marram Point, elevation 1,640 ft", notes: "Two storeys; balancing after the new reading room." }),
    await createProject(context, { name: "Dunlin Quay Clinic", number: "26-131", location: "Dunlin Quay" }),
  ];
  const instruments = await seedInstruments(context);
  const random = repeatable(3_114);
  for (const [index, story] of STORIES.entries()) {
    const plane = PLANES[index % PLANES.length]!;
    await seedTraverse(context, plane, story, { projectId: projects[plane.project]!.id, instrumentId: instruments[plane.instrument]!, day: 58 - index * 2, random });
  }
}

async function seedInstruments(context: RecordContext): Promise<string[]> {
  const make = async (fields: Parameters<typeof createInstrument>[1], calibrated: number | null, months = 12): Promise<string> => {
    const { id } = await createInstrument(context, fields);
    if (calibrated !== null) {
      await addCalibration(context, id, { calibratedOn: day(calibrated), dueOn: day(calibrated - Math.round(months * 30.4)), laboratory: "Saltmarsh Metrology", certificateNumber: `SM-${2_200 + calibrated}` });
    }
    return id;
  };
  return [
    await make({ name: "Micromanometer 2", serialNumber: "TA-0412", principle: "differential_pressure", accuracy: { percentOfReading: 1 }, probe: { coefficient: 1, diameter: inches(0.3125), length: inches(36) } }, 230),
    await make({ name: "Thermal probe 1", serialNumber: "TA-0377", principle: "thermal", accuracy: { percentOfReading: 3 } }, 345),
    await make({ name: "Vane 4 in", serialNumber: "TA-0298", principle: "rotating_vane", accuracy: { percentOfReading: 2 } }, 120),
    await make({ name: "Thermal probe 0", serialNumber: "TA-0101", principle: "thermal", notes: "Out of calibration; goes to the laboratory." }, 480),
  ];
}

interface Place {
  projectId: string;
  instrumentId: string;
  /** Days ago. */
  day: number;
  random: () => number;
}

async function seedTraverse(context: RecordContext, plane: Plane, story: Story, { projectId, instrumentId, day: ago, random }: Place): Promise<void> {
  const anyVersion = (): void => {};
  const readings = readingsOf({ ...plane, middle: story === "issued_low" ? plane.middle * 0.78 : plane.middle }, random);
  if (story === "draft_slip") readings.lines[0]![1] = swapped(readings.lines[0]![1]!);
  const holes = { count: plane.grid[0], sealed: story !== "draft_unsealed", method: "plugs" };
  const measured = {
    technician: "R. Okonjo-Lindqvist", takenAt: new Date(Date.now() - ago * DAY_MS - random() * 6 * 3_600_000).toISOString(), instrumentId, holes, readings, air: AIR,
    design: { airflow: { value: plane.design, unit: "ft3/min" as const } },
    ...(story === "issued_waived" && { calibrationWaiver: { reason: "Compared with Micromanometer 2 at three points on site; within 2 %." } }),
  };
  const begun = story === "draft_plan" ? {} : story === "draft_begun" ? { technician: measured.technician, instrumentId } : measured;
  const { id } = await createTraverse(context, { projectId, system: plane.system, location: plane.location, duct: plane.duct, layout: plane.layout, ...begun });
  if (story.startsWith("draft")) return;
  await issueTraverse(context, id, anyVersion);
  if (story === "void") await voidTraverse(context, id, "Taken before the fire damper was opened; to be repeated.", anyVersion);
  if (story === "superseded") {
    const revision = await reviseTraverse(context, id, anyVersion);
    await changeTraverse(context, revision.id, { notes: "Dry bulb corrected from the site notes.", air: { ...AIR, dryBulb: { value: 61, unit: "degF" } } }, anyVersion);
    await issueTraverse(context, revision.id, anyVersion);
  }
}

/** A reading with its last two digits written the wrong way round. */
function swapped(reading: number): number {
  const digits = String(reading);
  return Number(`${digits.slice(0, -2)}${digits.at(-1)}${digits.at(-2)}`);
}

const DAY_MS = 86_400_000;
const day = (ago: number): string => new Date(Date.now() - ago * DAY_MS).toISOString().slice(0, 10);
