import { useLayoutEffect, useRef, useState } from 'react';
import { Table, type TableProps } from './table';
import { useSize } from './use-size';
import { windowOf } from './window-rows';

interface WindowedTableProps<Row> extends Omit<TableProps<Row>, 'spaced'> {
  /** The box that scrolls; it must have a height of its own. */
  readonly className: string;
}

/** Before anything is measured; a row of one line. */
const ROW_PX = 36;

/** A table of any length: only the rows in view, and some to either side, are in the document. */
export function WindowedTable<Row>({ className, rows, ...table }: WindowedTableProps<Row>) {
  const box = useRef<HTMLDivElement>(null);
  const { height } = useSize(box);
  const [top_px, setTop] = useState(0);
  const [row_px, setRow] = useState(ROW_PX);
  const { from, to } = windowOf({ count: rows.length, row_px, top_px, height_px: height });

  useLayoutEffect(() => {
    const drawn = box.current?.querySelector<HTMLElement>('tbody > tr:not([aria-hidden])')?.offsetHeight ?? 0;
    // Text size and hand may change under a table; a row of no height is a table that is not laid out.
    if (drawn > 0 && drawn !== row_px) setRow(drawn);
  }, [row_px, rows.length, height]);

  return (
    <div
      ref={box}
      className={className}
      onScroll={(event) => {
        setTop(event.currentTarget.scrollTop);
      }}
    >
      <Table
        {...table}
        rows={rows.slice(from, to)}
        spaced={{
          first: from,
          count: rows.length,
          before_px: from * row_px,
          after_px: (rows.length - to) * row_px,
        }}
      />
    </div>
  );
}
