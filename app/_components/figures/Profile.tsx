import { Table } from "../data/Table";
import { formatNumber, unitSymbol } from "../format/number";

interface ProfileProps {
  points: { line: number; point: number; velocity: { value: number; unit: string } }[];
}

const PANEL = { width: 150, height: 84, side: 8, foot: 16 };

/** The velocity along each line, from its hole inwards: a panel for each, all to one scale. */
export function Profile({ points }: ProfileProps) {
  const unit = unitSymbol(points[0]?.velocity.unit ?? "");
  const greatest = Math.max(...points.map(({ velocity }) => velocity.value), 1e-9);
  const lines = [...new Set(points.map(({ line }) => line))].map((line) => ({ line, points: points.filter((one) => one.line === line) }));
  const most = Math.max(...points.map(({ point }) => point));
  return (
    <div>
      <ul className="flex flex-wrap gap-4" aria-label={`Velocity along each line, ${unit}; the table below has the figures`}>
        {lines.map(({ line, points: own }) => (
          <li key={line}>
            <Panel line={line} points={own.map(({ point, velocity }) => ({ x: most > 1 ? (point - 1) / (most - 1) : 0.5, y: velocity.value / greatest }))} />
          </li>
        ))}
      </ul>
      <details className="mt-3">
        <summary className="cursor-pointer text-small">Velocities as a table</summary>
        <Table caption={`Velocity, ${unit}`} maxHeight="20rem">
          <thead>
            <tr>
              <th scope="col">Line</th>
              <th scope="col">Point</th>
              <th scope="col" className="numeric">Velocity</th>
            </tr>
          </thead>
          <tbody>
            {points.map(({ line, point, velocity }) => (
              <tr key={`${line}/${point}`}>
                <td>{line}</td>
                <td>{point}</td>
                <td className="numeric font-mono">{formatNumber(velocity.value, { significant: 4 })}</td>
              </tr>
            ))}
          </tbody>
        </Table>
      </details>
    </div>
  );
}

function Panel({ line, points }: { line: number; points: { x: number; y: number }[] }) {
  const { width, height, side, foot } = PANEL;
  const place = ({ x, y }: { x: number; y: number }) => [side + x * (width - 2 * side), height - foot - y * (height - foot - side)] as const;
  return (
    <svg role="img" aria-label={`Line ${line}`} viewBox={`0 0 ${width} ${height}`} width={width} height={height} className="block font-mono" fontSize="10">
      <path d={`M${side} ${height - foot}H${width - side}`} stroke="var(--edge)" />
      <polyline points={points.map((point) => place(point).join(",")).join(" ")} fill="none" stroke="var(--action)" strokeWidth="1.5" />
      {points.map((point, index) => (
        <circle key={index} cx={place(point)[0]} cy={place(point)[1]} r="2.5" fill="var(--card)" stroke="var(--action)" />
      ))}
      <text x={side} y={height - 4} fill="var(--muted)">line {line}</text>
    </svg>
  );
}
