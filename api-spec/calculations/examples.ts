/** The invented scenario that the examples share: Marram Point Library, 1,640 ft above sea level. */

export const LINED_SUPPLY_MAIN = {
  shape: "rectangular" as const,
  measured: "outside" as const,
  width: { value: 26, unit: "in" as const },
  height: { value: 18, unit: "in" as const },
  wall: { lining: { value: 1, unit: "in" as const } },
};

export const EXHAUST_DUCT = { shape: "round" as const, measured: "inside" as const, diameter: { value: 14, unit: "in" as const } };

export const SUPPLY_AIR = {
  dryBulb: { value: 58, unit: "degF" as const },
  relativeHumidity: { value: 85, unit: "percent" as const },
  altitude: { value: 1640, unit: "ft" as const },
  ductStaticPressure: { value: 1.2, unit: "in_wg" as const },
};

export const SUPPLY_READINGS = {
  kind: "velocity_pressure" as const,
  unit: "in_wg" as const,
  lines: [
    [0.061, 0.074, 0.078, 0.073, 0.06],
    [0.071, 0.088, 0.092, 0.086, 0.07],
    [0.075, 0.091, 0.095, 0.09, 0.073],
    [0.07, 0.087, 0.091, 0.087, 0.071],
    [0.06, 0.073, 0.077, 0.074, 0.062],
  ],
};

export const EXHAUST_READINGS = {
  kind: "velocity" as const,
  unit: "m/s" as const,
  lines: [
    [4.12, 4.75, 5.14, 5.1, 4.68, 4.09],
    [4.05, 4.7, 5.15, 5.12, 4.72, 4.12],
  ],
};
