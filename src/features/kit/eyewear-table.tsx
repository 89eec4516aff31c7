import { Table, type Column } from '../../components/table';
import type { KitDoc } from '../../domain/book/documents/kit';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import { eyewearNeed, unmetLine, type EyewearNeed } from '../../domain/rules/eyewear-need';
import { formatFigure } from '../../domain/units/format-quantity';
import { isUnfit } from './kit-register';

interface NeedRow {
  readonly rig: RigDoc;
  readonly need: EyewearNeed;
  readonly meets: readonly KitDoc[];
}

interface Props {
  readonly rigs: readonly RigDoc[];
  readonly kit: readonly KitDoc[];
  readonly now_ms: number;
}

/** What each rig's own beam asks for, and which pairs of the register promise it. */
export function EyewearTable({ rigs, kit, now_ms }: Props) {
  const rows = rigs.map((rig) => needRow(rig, kit, now_ms));
  return (
    <div className="kit-need">
      <Table
        caption="What each rig’s beam asks for"
        hideCaption={false}
        columns={COLUMNS}
        rows={rows}
        rowKey={(row) => row.rig.id}
      />
      <p className="muted">
        By the rig’s own beam; dye light and whatever else is present comes on top, so eyewear stays on where
        it reads any. A pair must state a density at every wavelength that is there. The person responsible
        for laser safety decides.
      </p>
    </div>
  );
}

function needRow(rig: RigDoc, kit: readonly KitDoc[], now_ms: number): NeedRow {
  const need = eyewearNeed(latestRevision(rig).spec);
  const meets =
    need.type === 'known'
      ? kit.filter(
          (one) =>
            one.item.type === 'eyewear' &&
            !isUnfit(one, now_ms) &&
            unmetLine(one.item.densities, need.lines) === null,
        )
      : [];
  return { rig, need, meets };
}

const COLUMNS: readonly Column<NeedRow>[] = [
  { key: 'rig', head: 'rig', align: 'start', cell: ({ rig }) => rig.name },
  {
    key: 'line',
    head: 'nm',
    cell: ({ rig }) => formatFigure(latestRevision(rig).spec.beam.wavelength_nm, NM),
  },
  {
    key: 'need',
    head: 'OD at least',
    cell: ({ need }) => (need.type === 'known' ? needWords(need) : '\u2013'),
  },
  {
    key: 'meets',
    head: 'these meet it',
    align: 'start',
    cell: ({ need, meets }) => (
      <span className="kit-meets">
        {need.type === 'not-known'
          ? need.words
          : meets.length === 0
            ? 'none in the register'
            : meets.map((one) => one.number).join(', ')}
      </span>
    ),
  },
];

const NM = { digits: { decimals: 1 }, rounding: 'nearest' } as const;

function needWords(need: Extract<EyewearNeed, { type: 'known' }>): string {
  const most = Math.max(...need.lines.map((line) => line.density));
  // A density of 0 would read as "none needed".
  if (most === 0) return 'any';
  return formatFigure(most, { digits: { decimals: 1 }, rounding: 'up' });
}
