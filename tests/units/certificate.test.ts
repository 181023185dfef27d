import QRCode from "qrcode";
import { describe, expect, it } from "vitest";
import { CAUTIONS } from "@/lib/airflow/layout/cautions";
import { certificate } from "@/lib/certificate/certificate";
import { MARGIN } from "@/lib/certificate/sheet";
import type { Measurement } from "@/lib/records/issuedDocument";
import { grid, issued, nodes, options, readCertificate, SUPPLY_MAIN, type ReadCertificate } from "./certificateReader";

const read = async (...[document, given]: Partial<Parameters<typeof certificate>>): Promise<ReadCertificate> => readCertificate(await certificate(document ?? issued(), given ?? options()));
/** Letters, figures and signs alone: how a text is broken into lines and runs is left out. */
const close = (text: string): string => text.replace(/[\s_^]+/g, "");
const wordsOf = ({ pages }: ReadCertificate): string => close(pages.map(({ words }) => words).join(" "));

const OVAL: Measurement = {
  units: "si",
  duct: { shape: "flat_oval", measured: "inside", major: { value: 900, unit: "mm" }, minor: { value: 400, unit: "mm" } },
  layout: "equal_area",
  readings: { kind: "velocity_pressure", unit: "Pa", lines: grid(5, 6, (line, point) => 24 + line + point / 2) },
  air: { dryBulb: { value: 16, unit: "degC" }, relativeHumidity: { value: 60, unit: "percent" }, altitude: { value: 500, unit: "m" } },
  design: { airflow: { value: 2100, unit: "L/s" }, basis: "standard", tolerancePercent: 5 },
};
const EXHAUST: Measurement = {
  duct: { shape: "round", measured: "inside", diameter: { value: 14, unit: "in" } },
  layout: "log_linear",
  readings: { kind: "velocity", unit: "ft/min", lines: grid(2, 10, (line, point) => (line === 1 && point === 4 ? null : 1000 + 10 * point + line)) },
  air: { dryBulb: { value: 74, unit: "degF" }, wetBulb: { value: 62, unit: "degF" }, barometricPressure: { value: 28.2, unit: "inHg" } },
  instrument: { principle: "thermal" },
};
const THOUSAND: Measurement = { ...SUPPLY_MAIN, layout: "custom", readings: { kind: "velocity_pressure", unit: "in_wg", lines: grid(40, 25, (line, point) => (500 + 25 * line + point) / 10_000) } };
const SCRIPTS = "Überprüfung Łódź 空気量測定 وصف القياس 12 קובץ Воздуховод ρ≤1.2 हवा 한국어 ";

describe("a certificate", { timeout: 60_000 }, () => {
  it("stands on one page of US Letter with 25 readings and the whole working", async () => {
    const document = issued();
    const file = await read(document);
    expect(file.pages.map(({ width, height }) => [width, height])).toEqual([[612, 792]]);
    const words = wordsOf(file);
    const steps = document.result.working!.filter(({ step }) => !step.includes(" at line "));
    expect(steps.length).toBeGreaterThan(15);
    for (const { step, equation } of steps) expect(words, step).toContain(close(`${step}: ${equation} =`));
    expect(words).toContain(close("Velocity at each point: V = C √(2 p_v / ρ), values below the readings"));
    expect(words).toContain(close("p₀ 29.9213 in. Hg, L 0.0065 K/m"));
    expect(words).toContain("page1of1");
  });

  it("is A4 for results in SI, and one page", async () => {
    const { pages } = await read(issued(OVAL));
    expect(pages).toHaveLength(1);
    expect([pages[0]!.width, pages[0]!.height]).toEqual([595.28, 841.89]);
  });

  it("writes each reading as it was written, and below it its velocity", async () => {
    const { result } = issued();
    const items = (await read()).pages[0]!.items.map(({ words }) => words);
    const written = SUPPLY_MAIN.readings.lines.flat().map((reading) => reading!.toFixed(3));
    const first = items.findIndex((words, index) => words === "0.041" && items[index + 1] === "828");
    const velocities = result.points.map(({ velocity }) => Math.round(velocity.value).toLocaleString("en"));
    const cells = items.slice(first).filter((words) => words.includes(".") || Number(words.replace(",", "")) > 100).slice(0, 50);
    expect(cells).toEqual(written.flatMap((reading, index) => [reading, velocities[index]!]));
  });

  it("never rounds a reading", async () => {
    const fine: Measurement = { ...SUPPLY_MAIN, readings: { kind: "velocity_pressure", unit: "kPa", lines: [[0.012345, 0.0131, 0.0125]] }, instrument: undefined };
    const written = (await read(issued(fine))).pages[0]!.items.map(({ words }) => words);
    for (const reading of ["0.012345", "0.0131", "0.0125"]) expect(written).toContain(reading);
  });

  it("says what an engineer files it for", async () => {
    const words = wordsOf(await read());
    const facts = [
      "Marram Point Library, 26-114", "R. Okonjo-Lindqvist", "Tidewell Air Balance", "2026-11-20, 14:05 UTC", "2026-11-21, 09:12 UTC", "trv_01kb4x8m2wf3ptk7v0s6d9h1qe", "Revision 1, first issue",
      "Rectangular, 26 in × 18 in outside", "1 in lining", "24.00 × 16.00 in", "2.6667 ft²", "log-Tchebycheff", "5, sealed: plugs", "58 °F", "0.07202 lb/ft³", "Micromanometer 2", "TA-0412", "2026-03-02, due 2027-03-02",
      "Saltmarsh Metrology, SM-2213", "2,527 ft³/min", "± 63 ft³/min (2.5 %), expanded uncertainty, k = 2", "2,426 ft³/min", "182.0 lb/min", "Within tolerance, 97.2 % of design", "2,600 ft³/min ± 10 %",
      "Number of points: passed", "Layout and count 1.000 default", "Fan at 48 Hz, filters clean", "engine 1.0.0", "https://averduct.example/verify/trv_01kb4x8m2wf3ptk7v0s6d9h1qe", "Signed with key sig_01kb1c9v4ee0r8q6y2m5n7p3tz",
    ];
    for (const fact of facts) expect(words, fact).toContain(close(fact));
    for (const caution of CAUTIONS) expect(words).toContain(close(caution));
  });

  it("names a waiver with its reason, a point that was not read, and that there is no design", async () => {
    const words = wordsOf(await read(issued(EXHAUST, { instrument: null, calibrationWaiver: { reason: "The laboratory is closed until January." } })));
    for (const fact of ["no calibration in force", "The laboratory is closed until January.", "No design airflow was given", "Name not named"]) expect(words, fact).toContain(close(fact));
    expect((await read(issued(EXHAUST))).pages[0]!.items.filter(({ words: cell }) => cell === "–")).toHaveLength(1);
  });

  it("shows what is wrong in full and frames a suspected slip", async () => {
    const lines = SUPPLY_MAIN.readings.lines.map((line) => [...line]);
    lines[2]![2] = 0.66;
    const document = issued({ ...SUPPLY_MAIN, readings: { ...SUPPLY_MAIN.readings, lines } as Measurement["readings"] });
    const slip = document.result.checks.find(({ code }) => code === "possible_slip")!;
    expect(slip.passed).toBe(false);
    const words = wordsOf(await read(document));
    expect(words).toContain(close(`Possible slips, caution. ${slip.detail.replace(/in_wg/g, "in. w.g.")}`));
    expect(words).toContain(close("Framed: looks like a slip."));
  });

  it("says on every page that it is void, superseded or from the sandbox, and why", async () => {
    const long = { notes: "Line\n".repeat(120) };
    const cases = [
      { file: await read(issued(SUPPLY_MAIN, long), options({ status: "void", voidReason: "The wrong duct." })), head: "VoidThisrecordwaswithdrawn.Reason:Thewrongduct.", running: "VOID" },
      { file: await read(issued(SUPPLY_MAIN, long), options({ status: "superseded", supersededBy: "trv_2" })), head: "SupersededRecordtrv_2replacesthisone.Usethatone.", running: "SUPERSEDED" },
      { file: await read(issued(SUPPLY_MAIN, { ...long, environment: "sandbox" })), head: "SandboxThisrecordwasmadefortryingout.Itcertifiesnothing.", running: "SANDBOX" },
    ];
    for (const { file, head, running } of cases) {
      expect(close(file.pages[0]!.words)).toContain(close(head));
      expect(file.pages.length).toBeGreaterThan(1);
      for (const page of file.pages.slice(1)) expect(page.words).toContain(running);
    }
    expect(wordsOf(await read())).not.toMatch(/Void|withdrawn|Superseded|Sandbox/);
  });

  it("has a title, an author, a language and a date, and is tagged for assistive technology", async () => {
    const { info, marked, pages } = await read();
    expect(info).toMatchObject({ Title: "Duct traverse certificate: AHU-1, Supply main, north riser, revision 1", Author: "Tidewell Air Balance", Language: "en", CreationDate: "D:20261121091200Z" });
    expect(marked).toBe(true);
    const all = nodes(pages[0]!.structure);
    const count = (role: string): number => all.filter((node) => node.role === role).length;
    expect(count("Document")).toBe(1);
    expect(count("H1")).toBe(1);
    expect(count("H2")).toBeGreaterThan(8);
    expect(count("Link")).toBe(1);
    expect(count("Table")).toBe(6);
    // Each reading, and the cells of the other tables.
    expect(count("TD")).toBeGreaterThan(25);
    const figures = all.filter(({ role }) => role === "Figure").map(({ alt }) => alt ?? "");
    expect(figures).toHaveLength(3);
    expect(figures[0]).toBe(`QR code of ${options().verifyUrl}`);
    expect(figures[1]).toMatch(/^Measured 2,527 ± 63, tolerance from 2,340 to 2,860/);
    expect(figures[2]).toContain("Line 1: 0.041, 0.052, 0.055, 0.050, 0.040.");
  });

  it("carries a QR code whose modules are those of the address", async () => {
    const surface = (await read()).pages[0]!.surfaces.reduce((largest, one) => (one.length > largest.length ? one : largest));
    const [left, top] = [Math.min(...surface.map(({ x }) => x)), Math.min(...surface.map(({ y }) => y))];
    const step = surface[0]!.width;
    const dark = surface.map(({ x, y }) => `${Math.round((y - top) / step)}/${Math.round((x - left) / step)}`).sort();
    const { modules } = QRCode.create(options().verifyUrl, { errorCorrectionLevel: "M" });
    const expected = Array.from(modules.data, (value, index) => (value ? [`${Math.floor(index / modules.size)}/${index % modules.size}`] : [])).flat().sort();
    expect(dark).toEqual(expected);
  });

  it("can be followed to where it is verified", async () => {
    expect((await read()).pages[0]!.links).toEqual([options().verifyUrl]);
  });

  it("always comes to the same bytes, whatever was made in between", async () => {
    const first = await certificate(issued(), options());
    await certificate(issued(EXHAUST, { notes: `\u00a0\u2011${SCRIPTS}` }), options({ status: "void" }));
    expect((await certificate(issued(), options())).equals(first)).toBe(true);
    expect((await certificate(issued(SUPPLY_MAIN, { revision: 2 }), options())).equals(first)).toBe(false);
  });

  it("takes 1,000 readings over several pages, each numbered", async () => {
    const { pages } = await read(issued(THOUSAND));
    expect(pages.length).toBeGreaterThan(2);
    const written = new Set(pages.flatMap(({ items }) => items.map(({ words }) => words)));
    const missing = THOUSAND.readings.lines.flat().map((reading) => reading!.toFixed(4)).filter((reading) => !written.has(reading));
    expect(missing).toEqual([]);
    pages.forEach(({ words }, index) => expect(close(words)).toContain(`page${index + 1}of${pages.length}`));
  });

  it("writes the whole of long notes in whatever script", async () => {
    const notes = Array.from({ length: 400 }, (_, index) => `note${index}`).join(" ");
    expect(wordsOf(await read(issued(SUPPLY_MAIN, { notes }))).match(/note\d+/g)).toEqual(notes.split(" "));
    const words = wordsOf(await read(issued(SUPPLY_MAIN, { notes: `空気量測定 Воздуховод Łódź ρ≤1.2 \u{10fffd}` })));
    for (const part of ["空気量測定", "Воздуховод", "Łódź", "ρ≤1.2", "[U+10FFFD]"]) expect(words).toContain(part);
  });

  it("leaves nothing outside the margins, whatever the texts are", async () => {
    const names = { technician: "O".repeat(160), location: SCRIPTS.repeat(5), system: "W".repeat(120), project: { id: "prj", name: "x".repeat(160), number: "9".repeat(60), location: SCRIPTS }, organisation: { id: "org", name: SCRIPTS } };
    const files = [
      await read(),
      await read(issued(OVAL)),
      await read(issued(EXHAUST)),
      await read(issued(THOUSAND)),
      await read(issued(SUPPLY_MAIN, { ...names, notes: SCRIPTS.repeat(60), calibrationWaiver: { reason: "y".repeat(1000) }, holes: { count: 5, sealed: true, method: "z".repeat(200) } }), options({ status: "void", voidReason: SCRIPTS.repeat(15) })),
      await read(issued(SUPPLY_MAIN, { technician: "word ".repeat(800), notes: "\n".repeat(2000) })),
    ];
    for (const { pages } of files) {
      for (const { items, width, height } of pages) {
        // A page drawn smaller has margins so much smaller.
        const margin = MARGIN.side * 0.92 - 0.5;
        const beyond = items.filter(({ left, right, base }) => left < margin || right > width - margin || base < 8 || base > height - 20);
        expect(beyond).toEqual([]);
      }
    }
  });
});
