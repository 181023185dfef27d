import type { InstrumentPrinciple } from "@/lib/airflow/types";

/** How an instrument senses velocity, in words. */
export const PRINCIPLES: Record<InstrumentPrinciple, string> = { differential_pressure: "Differential pressure", thermal: "Thermal", rotating_vane: "Rotating vane" };
