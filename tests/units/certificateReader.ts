import { getDocument, OPS } from "pdfjs-dist/legacy/build/pdf.mjs";
import { airflow } from "@/lib/airflow/calculations/airflow";
import type { CertificateOptions } from "@/lib/certificate/certificate";
import type { IssuedDocument, Measurement } from "@/lib/records/issuedDocument";

/** A certificate read back by a parser that had no part in making it. */
export interface ReadCertificate {
  pages: ReadPage[];
  info: Record<string, unknown>;
  marked: boolean;
}

export interface ReadPage {
  width: number;
  height: number;
  /** Words in the order they were written, as far as one call wrote them, with their box. */
  items: { words: string; left: number; right: number; base: number }[];
  /** All of them, a space between. */
  words: string;
  structure: StructureNode;
  /** Addresses that can be followed. */
  links: string[];
  /** Rectangles that were filled as one surface, surface by surface. */
  surfaces: { x: number; y: number; width: number }[][];
}

export interface StructureNode {
  role?: string;
  alt?: string;
  children?: StructureNode[];
}

export async function readCertificate(file: Buffer): Promise<ReadCertificate> {
  const pdf = await getDocument({ data: new Uint8Array(file), verbosity: 0 }).promise;
  const { info } = await pdf.getMetadata();
  const marked = (await pdf.getMarkInfo())?.Marked === true;
  const pages = await Promise.all(Array.from({ length: pdf.numPages }, (_, index) => readPage(pdf, index + 1)));
  await pdf.destroy();
  return { pages, info: info as Record<string, unknown>, marked };
}

async function readPage(pdf: Awaited<ReturnType<typeof getDocument>["promise"]>, number: number): Promise<ReadPage> {
  const page = await pdf.getPage(number);
  const [, , width, height] = page.view as [number, number, number, number];
  const { items } = await page.getTextContent();
  const read = items.flatMap((item) => ("str" in item && item.str.trim() !== "" ? [{ words: item.str, left: item.transform[4] as number, right: (item.transform[4] as number) + (item.transform[1] === 0 ? 0 : item.width), base: item.transform[5] as number }] : []));
  const links = (await page.getAnnotations()).map(({ url }: { url?: string }) => url ?? "");
  const { fnArray, argsArray } = await page.getOperatorList();
  const surfaces = fnArray.flatMap((operator, index) => (operator === OPS.constructPath ? [rectanglesOf(argsArray[index] as [number[], number[]])] : []));
  return { width, height, items: read, words: read.map(({ words }) => words).join(" "), structure: (await page.getStructTree()) as StructureNode, links, surfaces };
}

function rectanglesOf([operators, numbers]: [number[], number[]]): { x: number; y: number; width: number }[] {
  if (!operators.every((operator) => operator === OPS.rectangle)) return [];
  return operators.map((_, index) => ({ x: numbers[index * 4]!, y: numbers[index * 4 + 1]!, width: numbers[index * 4 + 2]! }));
}

/** All nodes of a structure. */
export const nodes = (node: StructureNode): StructureNode[] => [node, ...(node.children ?? []).flatMap(nodes)];

export const grid = (lines: number, points: number, reading: (line: number, point: number) => number | null): (number | null)[][] =>
  Array.from({ length: lines }, (_, line) => Array.from({ length: points }, (_, point) => reading(line, point)));

/** An invented traverse of a lined supply main. */
export const SUPPLY_MAIN: Measurement = {
  duct: { shape: "rectangular", measured: "outside", width: { value: 26, unit: "in" }, height: { value: 18, unit: "in" }, wall: { lining: { value: 1, unit: "in" } } },
  layout: "log_tchebycheff",
  readings: {
    kind: "velocity_pressure", unit: "in_wg",
    lines: [[0.041, 0.052, 0.055, 0.05, 0.04], [0.05, 0.061, 0.064, 0.06, 0.048], [0.054, 0.063, 0.066, 0.062, 0.051], [0.052, 0.062, 0.064, 0.059, 0.049], [0.043, 0.053, 0.056, 0.051, 0.042]],
  },
  air: { dryBulb: { value: 58, unit: "degF" }, relativeHumidity: { value: 85, unit: "percent" }, altitude: { value: 1640, unit: "ft" }, ductStaticPressure: { value: 1.2, unit: "in_wg" } },
  instrument: { principle: "differential_pressure", accuracy: { percentOfReading: 1, absolute: { value: 0.001, unit: "in_wg" } } },
  site: { downstream: { value: 13, unit: "ft" }, upstream: { value: 5, unit: "ft" } },
  design: { airflow: { value: 2600, unit: "ft3/min" } },
};

/** An issued document round a measurement. */
export function issued(measurement: Measurement = SUPPLY_MAIN, changes: Partial<IssuedDocument> = {}): IssuedDocument {
  const { points: _points, enterFrom: _enterFrom, ...calculated } = measurement;
  return {
    format: "averduct/traverse/1",
    id: "trv_01kb4x8m2wf3ptk7v0s6d9h1qe",
    environment: "production",
    revision: 1,
    supersedes: null,
    organisation: { id: "org_01kb4x8m2wf3ptk7v0s6d9h1qa", name: "Tidewell Air Balance" },
    project: { id: "prj_01kb4x8m2wf3ptk7v0s6d9h1qb", name: "Marram Point Library", number: "26-114", location: "1,640 ft" },
    system: "AHU-1",
    location: "Supply main, north riser",
    technician: "R. Okonjo-Lindqvist",
    takenAt: "2026-11-20T14:05:00.000Z",
    issuedAt: "2026-11-21T09:12:00.000Z",
    notes: "Fan at 48 Hz, filters clean, all terminal dampers open.",
    holes: { count: 5, sealed: true, method: "plugs" },
    instrument: {
      id: "ins_01kb4x8m2wf3ptk7v0s6d9h1qc", name: "Micromanometer 2", manufacturer: null, model: null, serialNumber: "TA-0412",
      calibration: { id: "cal_01kb4x8m2wf3ptk7v0s6d9h1qd", calibratedOn: "2026-03-02", dueOn: "2027-03-02", laboratory: "Saltmarsh Metrology", certificateNumber: "SM-2213" },
    },
    calibrationWaiver: null,
    measurement,
    result: airflow({ ...calculated, working: true }),
    engineVersion: "1.0.0",
    ...changes,
  };
}

export const options = (changes: Partial<CertificateOptions> = {}): CertificateOptions => ({
  verifyUrl: "https://averduct.example/verify/trv_01kb4x8m2wf3ptk7v0s6d9h1qe",
  status: "issued",
  signingKeyId: "sig_01kb1c9v4ee0r8q6y2m5n7p3tz",
  ...changes,
});
