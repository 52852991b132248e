import type { ReactNode } from 'react';
import { useLayout } from './layout';

export interface DataColumn {
  key: string;
  head: ReactNode;
  /** Iosevka. */
  mono?: boolean;
  align?: 'left' | 'right';
}

export interface DataRow {
  key: string;
  /** One cell per column key. */
  cells: Record<string, ReactNode>;
}

export interface DataTableProps {
  /** What the table shows; read out, and seen unless `hideCaption`. */
  caption: string;
  hideCaption?: boolean;
  columns: readonly DataColumn[];
  rows: readonly DataRow[];
  /** Hairlines between rows. */
  ruled?: boolean;
  selected?: string | null;
  onSelect?: (key: string) => void;
  /** Keep the table on a phone: few and narrow columns. */
  narrow?: boolean;
}

const cellClass = ({ mono, align }: DataColumn): string =>
  [mono && 'r-mono', align === 'right' && 'r-right'].filter(Boolean).join(' ');

function Cards({ caption, columns, rows, selected }: DataTableProps) {
  return (
    <div role="group" aria-label={caption}>
      {rows.map((row) => (
        <dl key={row.key} className="r-cells" data-selected={row.key === selected}>
          {columns.map((column) => (
            <div key={column.key} style={{ display: 'contents' }}>
              <dt>{column.head}</dt>
              <dd className={column.mono ? 'r-mono' : undefined}>{row.cells[column.key]}</dd>
            </div>
          ))}
        </dl>
      ))}
    </div>
  );
}

function Row({
  row,
  columns,
  selected,
  onSelect,
}: { row: DataRow } & Pick<DataTableProps, 'columns' | 'selected' | 'onSelect'>) {
  return (
    <tr
      {...(row.key === selected && { 'aria-current': 'true' as const })}
      {...(onSelect && { 'data-selectable': '', onClick: () => onSelect(row.key) })}
    >
      {columns.map((column, index) => (
        <td key={column.key} className={cellClass(column)}>
          {index === 0 && onSelect ? (
            <button type="button" className="r-cell-button" onClick={() => onSelect(row.key)}>
              {row.cells[column.key]}
            </button>
          ) : (
            row.cells[column.key]
          )}
        </td>
      ))}
    </tr>
  );
}

/** A table; on a phone its rows become cards, so that nothing scrolls sideways. */
export function DataTable(props: DataTableProps) {
  const { caption, hideCaption, columns, rows, ruled, narrow } = props;
  const phone = useLayout() === 'phone';
  if (phone && !narrow) return <Cards {...props} />;
  return (
    <table className={ruled ? 'r-table r-ruled' : 'r-table'}>
      <caption className={hideCaption ? 'r-hidden' : undefined}>{caption}</caption>
      <thead>
        <tr>
          {columns.map((column) => (
            <th key={column.key} scope="col" className={column.align === 'right' ? 'r-right' : undefined}>
              {column.head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.key} row={row} {...props} />
        ))}
      </tbody>
    </table>
  );
}
