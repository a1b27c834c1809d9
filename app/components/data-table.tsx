import { type ReactNode, useState } from 'react';

export interface Column<Row> {
  key: string;
  /** With its unit: "Cold, psi". */
  head: ReactNode;
  cell: (row: Row) => ReactNode;
  /** Right-aligned; give every figure of a column the same decimals, so that the points align. */
  figure?: boolean;
  /** Names the row, for a screen reader. */
  rowHead?: boolean;
  /** Utilities for head and cells: `max-sm:hidden` where a phone has no room. */
  className?: string;
  /** Makes the column sortable. */
  sortBy?: (row: Row) => number | string;
}

export interface DataTableProps<Row> {
  caption?: ReactNode;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
}

interface Order {
  key: string;
  down: boolean;
}

/** A table with real headers, sortable where a column says by what. */
export function DataTable<Row>({ caption, columns, rows, rowKey }: DataTableProps<Row>) {
  const [order, setOrder] = useState<Order>();
  const sorted = sortRows(rows, columns, order);
  const turn = (key: string) =>
    setOrder((now) => ({ key, down: now?.key === key ? !now.down : false }));
  return (
    // Wider than a phone, it scrolls; a keyboard has to reach it for that.
    <section className="table-wrap" aria-label="Table" tabIndex={0}>
      <table className="data-table">
        {caption && <caption>{caption}</caption>}
        <thead>
          <tr>
            {columns.map((column) => (
              <HeadCell key={column.key} column={column} order={order} onTurn={turn} />
            ))}
          </tr>
        </thead>
        <tbody>
          {sorted.map((row) => (
            <tr key={rowKey(row)}>
              {columns.map((column) => (
                <BodyCell key={column.key} column={column} row={row} />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}

function HeadCell<Row>({
  column,
  order,
  onTurn,
}: {
  column: Column<Row>;
  order: Order | undefined;
  onTurn: (key: string) => void;
}) {
  const mine = order?.key === column.key ? order : undefined;
  const sort = mine && (mine.down ? 'descending' : 'ascending');
  return (
    <th scope="col" className={classOf(column)} aria-sort={sort}>
      {column.sortBy ? (
        <button type="button" className="sort" onClick={() => onTurn(column.key)}>
          {column.head}
          {mine ? (mine.down ? ' ↓' : ' ↑') : ''}
        </button>
      ) : (
        column.head
      )}
    </th>
  );
}

function BodyCell<Row>({ column, row }: { column: Column<Row>; row: Row }) {
  const className = classOf(column);
  if (!column.rowHead) return <td className={className}>{column.cell(row)}</td>;
  return (
    <th scope="row" className={className}>
      {column.cell(row)}
    </th>
  );
}

function classOf<Row>({ figure, className }: Column<Row>): string | undefined {
  return [figure && 'figure', className].filter(Boolean).join(' ') || undefined;
}

function sortRows<Row>(
  rows: readonly Row[],
  columns: readonly Column<Row>[],
  order: Order | undefined,
): readonly Row[] {
  const by = columns.find((column) => column.key === order?.key)?.sortBy;
  if (!by || !order) return rows;
  const sorted = [...rows].sort((a, b) => compare(by(a), by(b)));
  return order.down ? sorted.reverse() : sorted;
}

function compare(a: number | string, b: number | string): number {
  if (typeof a === 'number' && typeof b === 'number') return a - b;
  return String(a).localeCompare(String(b), 'en', { numeric: true });
}
