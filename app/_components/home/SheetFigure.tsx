import type { AirflowAnswer } from "@/lib/airflow/calculations/airflow";
import { CrossSection } from "../figures/CrossSection";
import { numberIn, type SheetEntries } from "./example";

/** Five points by log-Tchebycheff, as fractions of the side. ISO 3966. */
const POSITIONS = [0.074, 0.288, 0.5, 0.712, 0.926];

/** The sheet's duct with what was read in it and what the API made of it. */
export function SheetFigure({ entries, answer }: { entries: SheetEntries; answer: AirflowAnswer | null }) {
  const [width, height, lining] = [entries.fields.width, entries.fields.height, entries.fields.lining].map((text) => numberIn(text) ?? 0);
  const inside = { width: (width ?? 0) - 2 * (lining ?? 0), height: (height ?? 0) - 2 * (lining ?? 0) };
  if (!(inside.width > 0) || !(inside.height > 0)) {
    return <p className="text-small text-muted">These dimensions and this lining leave no duct to draw.</p>;
  }
  const suspected = new Set(answer?.checks.find(({ code, passed }) => code === "possible_slip" && !passed)?.at?.map(({ line, point }) => `${line}/${point}`));
  const velocities = new Map(answer?.points.map(({ line, point, velocity }) => [`${line}/${point}`, velocity.value]));

  return (
    <CrossSection
      duct={{ shape: "rectangular", ...inside, wall: lining ?? 0, unit: "in" }}
      holes={POSITIONS}
      readingUnit="in_wg"
      velocityUnit="ft/min"
      points={entries.lines.flatMap((line, l) =>
        line.map((text, p) => {
          const place = `${l + 1}/${p + 1}`;
          return {
            line: l + 1,
            point: p + 1,
            x: POSITIONS[l] ?? 0.5,
            y: POSITIONS[p] ?? 0.5,
            reading: text.trim() || null,
            velocity: velocities.get(place) ?? null,
            suspected: suspected.has(place),
          };
        }),
      )}
    />
  );
}
