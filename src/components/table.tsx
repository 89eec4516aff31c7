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
  /** These rows are a window of a longer table: where they stand in it, and the room of those that are not drawn. */
  readonly spaced?: {
    readonly first: number;
    readonly count: number;
    readonly before_px: number;
    readonly after_px: number;
  };
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
  spaced,
}: TableProps<Row>) {
  return (
    <table className="figures" {...(spaced === undefined ? {} : { 'aria-rowcount': spaced.count + 1 })}>
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
        <Room px={spaced?.before_px ?? 0} />
        {rows.map((row, i) => {
          const key = rowKey(row);
          return (
            <tr
              key={key}
              className={key === picked ? 'picked' : ''}
              {...(spaced === undefined ? {} : { 'aria-rowindex': spaced.first + i + 2 })}
            >
              {columns.map((column) => (
                <td key={column.key} className={column.align ?? 'end'}>
                  {column.cell(row)}
                </td>
              ))}
            </tr>
          );
        })}
        <Room px={spaced?.after_px ?? 0} />
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

function Room({ px }: { readonly px: number }) {
  return px === 0 ? null : <tr aria-hidden="true" style={{ height: px }} />;
}
