"use client";

import { useId, useMemo, useState, type ReactNode } from "react";
import { formatCount, formatNumber } from "../format/number";
import { Table } from "./Table";

export interface Column {
  key: string;
  header: string;
  /** Figures: set at the right, in the monospaced face. */
  numeric?: boolean;
  /** Sorted by its header unless false. */
  sortable?: boolean;
}

type Plain = string | number | null;
/** A plain value, or what is shown together with the plain value it sorts and filters by. */
export type Cell = Plain | { show: ReactNode; value: Plain };

export interface Row {
  id: string;
  cells: Record<string, Cell>;
}

interface DataTableProps {
  caption: string;
  hideCaption?: boolean;
  columns: Column[];
  rows: Row[];
  /** Label of a field that narrows the rows to those with its words; no field when left out. */
  filter?: string;
  /** Column that names the row. The first when left out. */
  rowHeader?: string;
  sortedBy?: { key: string; descending?: boolean };
  /** In place of the table when there are no rows at all. */
  empty?: ReactNode;
}

const plain = (cell: Cell | undefined): Plain => (cell != null && typeof cell === "object" ? cell.value : (cell ?? null));

const compare = (a: Plain, b: Plain): number => {
  if (a === null || b === null) return a === b ? 0 : a === null ? 1 : -1;
  return typeof a === "number" && typeof b === "number" ? a - b : String(a).localeCompare(String(b), "en", { numeric: true });
};

/** Rows that can be sorted and narrowed in the page. Everything it takes may come from a server component. */
export function DataTable({ caption, hideCaption, columns, rows, filter, rowHeader = columns[0]?.key, sortedBy, empty }: DataTableProps) {
  const [order, setOrder] = useState(sortedBy ?? null);
  const [words, setWords] = useState("");
  const filterId = useId();

  const shown = useMemo(() => {
    const wanted = words.toLocaleLowerCase("en").split(/\s+/).filter(Boolean);
    const kept = rows.filter(({ cells }) => {
      const text = columns.map(({ key }) => plain(cells[key]) ?? "").join(" ").toLocaleLowerCase("en");
      return wanted.every((word) => text.includes(word));
    });
    if (!order) return kept;
    const sign = order.descending ? -1 : 1;
    return kept.toSorted((a, b) => sign * compare(plain(a.cells[order.key]), plain(b.cells[order.key])));
  }, [rows, columns, words, order]);

  if (rows.length === 0 && empty) return <>{empty}</>;

  const sortBy = (key: string) => setOrder((now) => ({ key, descending: now?.key === key ? !now.descending : false }));

  return (
    <div>
      {filter && (
        <div className="mb-2 flex flex-wrap items-center gap-x-3 gap-y-1">
          <label htmlFor={filterId} className="text-small font-medium">
            {filter}
          </label>
          <input id={filterId} type="search" value={words} onChange={(event) => setWords(event.target.value)} className="blank max-w-64 text-small" />
          <span role="status" className="text-small text-muted">
            {words ? `${formatNumber(shown.length)} of ${formatCount(rows.length, "row")}` : formatCount(rows.length, "row")}
          </span>
        </div>
      )}
      <Table caption={caption} hideCaption={hideCaption}>
        <thead>
          <tr>
            {columns.map(({ key, header, numeric, sortable = true }) => {
              const direction = order?.key === key ? (order.descending ? "descending" : "ascending") : undefined;
              return (
                <th key={key} scope="col" aria-sort={direction} className={numeric ? "numeric" : undefined}>
                  {sortable ? (
                    <button type="button" onClick={() => sortBy(key)} className="font-medium hover:text-ink">
                      {header}
                      <SortSign direction={direction} />
                    </button>
                  ) : (
                    header
                  )}
                </th>
              );
            })}
          </tr>
        </thead>
        <tbody>
          {shown.map(({ id, cells }) => (
            <tr key={id} className="hover:bg-inset">
              {columns.map(({ key, numeric }) => {
                const Tag = key === rowHeader ? "th" : "td";
                return (
                  <Tag key={key} scope={Tag === "th" ? "row" : undefined} className={numeric ? "numeric" : undefined}>
                    <Shown cell={cells[key]} />
                  </Tag>
                );
              })}
            </tr>
          ))}
          {shown.length === 0 && (
            <tr>
              <td colSpan={columns.length} className="text-muted">
                {rows.length === 0 ? "No rows." : "No row has these words."}
              </td>
            </tr>
          )}
        </tbody>
      </Table>
    </div>
  );
}

function Shown({ cell }: { cell: Cell | undefined }) {
  if (cell == null) return <span className="text-muted">–</span>;
  if (typeof cell === "object") return <>{cell.show}</>;
  return <>{typeof cell === "number" ? formatNumber(cell) : cell}</>;
}

/** Two wedges; the one that holds is filled. */
function SortSign({ direction }: { direction: "ascending" | "descending" | undefined }) {
  return (
    <svg viewBox="0 0 8 12" width="8" height="12" aria-hidden className="ml-1.5 inline-block" fill="none" stroke="currentColor" strokeWidth="1">
      <path d="M1 5l3-4 3 4z" fill={direction === "ascending" ? "currentColor" : "none"} />
      <path d="M1 7l3 4 3-4z" fill={direction === "descending" ? "currentColor" : "none"} />
    </svg>
  );
}
