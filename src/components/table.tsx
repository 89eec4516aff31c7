import type { ReactNode } from 'react';

export interface Column<Row> {
  readonly key: string;
  readonly head: ReactNode;
  readonly cell: (row: Row) => ReactNode;
  readonly align?: 'start' | 'end';
}

export interface TableProps<Row> {
  readonly caption: string;
  readonly hideCaption?: boolean;
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  /** Key of the row that is being looked at. */
  readonly picked?: string;
  readonly foot?: ReactNode;
}

/** Figures in rows; the header stays while they scroll. */
export function Table<Row>({
  caption,
  hideCaption = true,
  columns,
  rows,
  rowKey,
  picked,
  foot,
}: TableProps<Row>) {
  return (
    <table className="figures">
      <caption className={hideCaption ? 'heard-only' : ''}>{caption}</caption>
      <thead>
        <tr>
          {columns.map((column) => (
            <th key={column.key} scope="col" className={column.align ?? 'end'}>
              {column.head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => {
          const key = rowKey(row);
          return (
            <tr key={key} className={key === picked ? 'picked' : ''}>
              {columns.map((column) => (
                <td key={column.key} className={column.align ?? 'end'}>
                  {column.cell(row)}
                </td>
              ))}
            </tr>
          );
        })}
      </tbody>
      {foot === undefined ? null : (
        <tfoot>
          <tr>
            <td colSpan={columns.length}>{foot}</td>
          </tr>
        </tfoot>
      )}
    </table>
  );
}
