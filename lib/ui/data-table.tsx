import type { ReactNode } from "react";

export interface DataColumn<Row> {
  id: string;
  head: ReactNode;
  cell: (row: Row) => ReactNode;
  /** Numbers stand right-aligned in the mono face. */
  numeric?: boolean;
  /** The cell that names its row. */
  rowHead?: boolean;
  /** Falls away on narrow screens. */
  wideOnly?: boolean;
  /** Never wraps. */
  tight?: boolean;
}

export interface DataTableProps<Row> {
  /** What the table holds; read out, and shown when `showCaption`. */
  caption: ReactNode;
  showCaption?: boolean;
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string | number;
  /** A status of the row, for a mark at its left edge: the word belongs in a cell. */
  rowStatus?: (row: Row) => "watch" | "out" | "implausible" | undefined;
  /** Shown instead of an empty body (an EmptyState). */
  empty?: ReactNode;
  /** Height at which the body scrolls under its head, e.g. "60vh". */
  maxHeight?: string;
  className?: string;
}

/** A plain table: head that stays, its own sideways scroll, numbers to the right. For thousands of rows use the grid. */
export function DataTable<Row>(props: DataTableProps<Row>) {
  const {
    caption,
    showCaption = false,
    columns,
    rows,
    rowKey,
    rowStatus,
    empty,
    maxHeight,
    className = "",
  } = props;
  if (rows.length === 0 && empty !== undefined) return <>{empty}</>;
  return (
    // a scrolling region must be reachable by keyboard
    <div
      className={`table-scroll ${className}`}
      style={{ maxHeight }}
      tabIndex={0}
      role="region"
      aria-label={typeof caption === "string" ? caption : undefined}
    >
      <table className="data-table">
        <caption className={showCaption ? "pb-2 text-left font-semibold" : "sr-only"}>{caption}</caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <th key={column.id} scope="col" className={cellClass(column)}>
                {column.head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={rowKey(row)} data-status={rowStatus?.(row)}>
              {columns.map((column) =>
                column.rowHead ? (
                  <th key={column.id} scope="row" className={cellClass(column)}>
                    {column.cell(row)}
                  </th>
                ) : (
                  <td key={column.id} className={cellClass(column)}>
                    {column.cell(row)}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function cellClass(column: { numeric?: boolean; wideOnly?: boolean; tight?: boolean }): string {
  return [
    column.numeric && "cell-num",
    column.wideOnly && "max-sm:hidden",
    column.tight && "whitespace-nowrap",
  ]
    .filter(Boolean)
    .join(" ");
}
