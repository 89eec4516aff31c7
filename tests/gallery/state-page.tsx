import { GapMark } from '../../src/components/gap-mark';
import { HoldFill } from '../../src/components/hold-fill';
import { StateStrip, type StateStripProps } from '../../src/components/state-strip';
import { WideMark } from '../../src/components/wide-mark';

const MARKS = [
  ['bridged', false],
  ['open', false],
  ['jagged', false],
  ['dashed', false],
  ['open', true],
  ['dashed', true],
  ['bridged', true],
  ['jagged', true],
] as const;

const STRIPS: readonly StateStripProps[] = [
  {
    mark: 'bridged',
    ground: 'outline',
    title: 'Kettle',
    state: 'Shorted, declared',
    detail: '14 min ago, Milo Venn',
    count: '12 to hand over',
    age_h: 0.23,
  },
  {
    mark: 'open',
    ground: 'half',
    title: 'Kettle',
    state: 'Short off',
    detail: '2 min ago, Ada Brook',
    count: '13 to hand over',
    age_h: 0.03,
  },
  {
    mark: 'jagged',
    ground: 'solid',
    title: 'Kettle',
    state: 'Firing',
    detail: 'open 38 min',
    count: '61 to hand over',
    age_h: 0.63,
  },
  {
    mark: 'dashed',
    ground: 'dash',
    title: 'Kettle',
    state: 'Not known: treat as charged',
    detail: 'tablet restarted 16:31',
    count: '12 to hand over',
  },
  {
    mark: 'open',
    ground: 'half',
    hatched: true,
    title: 'Kettle',
    state: 'Short off, stood down by Milo Venn',
    detail: '9 Dec',
    count: '14 to hand over',
  },
  {
    mark: 'dashed',
    ground: 'dash',
    hatched: true,
    title: 'Kettle',
    state: 'Not known: treat as charged, stood down by Milo Venn',
    count: '14 to hand over',
  },
  {
    mark: 'jagged',
    ground: 'solid',
    title: 'Kettle',
    state: 'Firing',
    detail: 'open 38 min',
    notice: 'touches ignored: electrical noise',
    count: '61 to hand over',
  },
];

export function StatePage() {
  return (
    <div className="flex flex-col gap-4">
      <div className="grid grid-cols-4 gap-5 p-5">
        {MARKS.map(([state, hatched]) => (
          <div key={`${state}${hatched}`} style={{ width: 150 }}>
            <GapMark state={state} hatched={hatched} className="block w-full" title={state} />
          </div>
        ))}
      </div>
      {STRIPS.map((strip) => (
        <StateStrip key={strip.state + (strip.notice ?? '')} {...strip} />
      ))}
      {(
        [
          [
            '',
            { phase: 'holding', progress: 0.4, left_ms: 400, label: 'Hold: stand Kettle down', words: '' },
          ],
          [
            'solid',
            { phase: 'writing', progress: 1, left_ms: 0, label: 'Hold: close firing. Writing', words: '' },
          ],
          [
            '',
            {
              phase: 'failed',
              progress: 0.7,
              left_ms: 0,
              label: '',
              words: 'Not logged. Kept as draft. Hold again.',
            },
          ],
        ] as const
      ).map(([ground, view]) => (
        <div key={view.phase} className={`state-strip ${ground === 'solid' ? 'ground-solid' : ''}`}>
          <HoldFill view={view} />
        </div>
      ))}
      <WideMark
        state="dashed"
        depth_mm={22}
        title={
          <div className="text-face font-[700] leading-[0.98] tracking-tight whitespace-pre-line">
            {'Not known:\ntreat as\ncharged'}
          </div>
        }
      />
      <div style={{ height: 420 }}>
        <WideMark
          state="jagged"
          solid
          depth_mm={22}
          title={<div className="text-face font-[700] leading-none tracking-tight">Firing</div>}
        />
      </div>
      <WideMark
        state="bridged"
        hatched
        title={<div className="text-answer font-[660]">Shorted, stood down</div>}
      />
    </div>
  );
}
