import type { ReactNode } from "react";
import { Select } from "../forms/Select";
import { TextInput } from "../forms/TextInput";
import { unitSymbol } from "../format/number";
import { BLANK_UNITS, LAYOUTS, SHAPE_BLANKS, type BenchField, type BenchSheet } from "./benchSheet";

interface BenchFieldsProps {
  sheet: BenchSheet;
  /** Fields that hold no number. */
  wrong: BenchField[];
  onChange: (change: Partial<BenchSheet>) => void;
}

const LAYOUT_NAMES = { log_tchebycheff: "Log-Tchebycheff", log_linear: "Log-linear", equal_area: "Equal area", method_1: "Method 1", custom: "Custom" };

/** The blanks of the Bench: duct, layout, air, instrument, design. */
export function BenchFields({ sheet, wrong, onChange }: BenchFieldsProps) {
  const units = BLANK_UNITS[sheet.units];
  const blank = (field: BenchField, label: string, unit: string, hint?: string) => (
    <TextInput
      key={field} name={field} label={label} hint={hint} unit={unitSymbol(unit)} inputMode="decimal" autoComplete="off" value={sheet[field]}
      error={wrong.includes(field) ? "Write a number" : undefined}
      onChange={(event) => onChange({ [field]: event.target.value })}
    />
  );
  const choice = <Field extends BenchField>(field: Field, label: string, choices: { value: string; label: string }[], also: (value: string) => Partial<BenchSheet> = () => ({})) => (
    <Select name={field} label={label} choices={choices} value={sheet[field]} onChange={(event) => onChange({ [field]: event.target.value, ...also(event.target.value) })} />
  );
  return (
    <form aria-label="What was measured" onSubmit={(event) => event.preventDefault()} className="grid gap-4">
      <Row legend="Duct">
        {choice("shape", "Shape", [{ value: "rectangular", label: "Rectangular" }, { value: "round", label: "Round" }, { value: "flat_oval", label: "Flat oval" }], (shape) => ({ layout: LAYOUTS[shape as BenchSheet["shape"]][0]! }))}
        {choice("measured", "Measured", [{ value: "inside", label: "Inside" }, { value: "outside", label: "Outside" }])}
        {SHAPE_BLANKS[sheet.shape].map(({ field, label }) => blank(field, label, units.length))}
        {blank("lining", "Lining", units.length)}
      </Row>
      <Row legend="Traverse">
        {choice("layout", "Layout", LAYOUTS[sheet.shape].map((value) => ({ value, label: LAYOUT_NAMES[value] })))}
        {choice("enterFrom", "Drilled from", ["top", "bottom", "left", "right"].map((value) => ({ value, label: value[0]!.toUpperCase() + value.slice(1) })))}
        {choice("kind", "Read as", [{ value: "velocity_pressure", label: "Velocity pressure" }, { value: "velocity", label: "Velocity" }])}
        {choice("principle", "Instrument", [{ value: "", label: "Not said" }, { value: "differential_pressure", label: "Differential pressure" }, { value: "thermal", label: "Thermal" }, { value: "rotating_vane", label: "Rotating vane" }])}
        {choice("units", "Units", [{ value: "ip", label: "in, ft/min" }, { value: "si", label: "mm, m/s" }])}
      </Row>
      <Row legend="Air and design">
        {blank("dryBulb", "Dry bulb", units.temperature)}
        {blank("humidity", "Relative humidity", "percent")}
        {blank("altitude", "Altitude", units.altitude)}
        {blank("ductStatic", "Duct static", units.pressure)}
        {blank("design", "Design airflow", units.airflow)}
        {blank("tolerance", "Tolerance", "percent")}
      </Row>
    </form>
  );
}

function Row({ legend, children }: { legend: string; children: ReactNode }) {
  return (
    <fieldset>
      <legend className="mb-1 text-small font-semibold">{legend}</legend>
      <div className="grid grid-cols-2 items-end gap-x-4 gap-y-3 sm:grid-cols-3 lg:grid-cols-5">{children}</div>
    </fieldset>
  );
}
