import { clsx } from 'clsx';
import type { ReactNode } from 'react';

export type Column<Row> = {
  key: string;
  /** the column's name; a hidden one is still read out */
  head: string;
  headShown?: 'shown' | 'hidden';
  cell: (row: Row) => ReactNode;
  align?: 'start' | 'end';
  /** `name` heads its row and is the heaviest in it; `figure` never breaks */
  role?: 'name' | 'figure' | 'text';
  /** a class such as `w-24` */
  width?: string;
};

type Props<Row> = {
  /** what the table holds; read out */
  caption: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** `at` for the row one is working on, `dim` for one that counts less */
  rowState?: (row: Row) => 'plain' | 'at' | 'dim';
  /** stays in view while the page scrolls */
  head?: 'plain' | 'sticky';
  /** how much a row's cells hold: beside fields and buttons a single line stands in the middle */
  lines?: 'several' | 'one';
};

/** In some browsers a changed `display` takes a table's roles away, so they are written down. */
const as = {
  table: { role: 'table' },
  rowgroup: { role: 'rowgroup' },
  row: { role: 'row' },
  columnheader: { role: 'columnheader' },
  rowheader: { role: 'rowheader' },
  cell: { role: 'cell' },
} as const;

/** A real table; where its columns don't fit, every row becomes a short list with the columns' names (see table.css). */
export function Table<Row>({
  caption,
  columns,
  rows,
  rowKey,
  rowState,
  head = 'plain',
  lines = 'several',
}: Props<Row>) {
  return (
    <div className="stacks">
      <table {...as.table} className="w-full border-collapse text-start">
        <caption className="sr-only">{caption}</caption>
        <thead {...as.rowgroup} className={clsx(head === 'sticky' && 'sticky top-0 z-10 bg-surface')}>
          <tr {...as.row}>
            {columns.map((column) => (
              <th
                key={column.key}
                {...as.columnheader}
                scope="col"
                className={clsx(
                  'border-b border-line px-2.5 py-2 text-xs font-bold text-ink2',
                  column.align === 'end' ? 'text-end' : 'text-start',
                  column.width,
                )}
              >
                {column.headShown === 'hidden' ? <span className="sr-only">{column.head}</span> : column.head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody {...as.rowgroup}>
          {rows.map((row) => (
            <TableRow key={rowKey(row)} columns={columns} row={row} state={rowState?.(row) ?? 'plain'} lines={lines} />
          ))}
        </tbody>
      </table>
    </div>
  );
}

function TableRow<Row>({
  columns,
  row,
  state,
  lines,
}: {
  columns: readonly Column<Row>[];
  row: Row;
  state: 'plain' | 'at' | 'dim';
  lines: 'several' | 'one';
}) {
  return (
    <tr
      {...as.row}
      aria-current={state === 'at' ? 'true' : undefined}
      className={clsx(state === 'at' && 'bg-tint', state === 'dim' && 'text-ink2')}
    >
      {columns.map((column) => {
        const look = clsx(
          'border-b border-line px-2.5 py-2 text-sm',
          lines === 'several' ? 'align-top' : 'align-middle',
          column.align === 'end' ? 'text-end' : 'text-start',
          column.role === 'name' && 'font-extrabold',
          column.role === 'figure' && 'whitespace-nowrap',
        );
        const inside = (
          <>
            {column.headShown !== 'hidden' && (
              <span className="cell-name" aria-hidden="true">
                {column.head}
              </span>
            )}
            <span className="block min-w-0">{column.cell(row)}</span>
          </>
        );
        return column.role === 'name' ? (
          <th key={column.key} {...as.rowheader} scope="row" className={look}>
            {inside}
          </th>
        ) : (
          <td key={column.key} {...as.cell} className={look}>
            {inside}
          </td>
        );
      })}
    </tr>
  );
}
