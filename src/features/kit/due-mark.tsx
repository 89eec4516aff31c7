import type { Due } from './kit-register';

const WIDTH = 54;
const HEIGHT = 24;
/** Of each face; the void between them is what is left of the time. */
const FACE = 14;
const MOST_VOID = WIDTH - 2 * FACE;

/** Two faces that close as the date comes near: open, closing, shut when overdue, hatched when it failed. */
export function DueMark({ due }: { readonly due: Due }) {
  const open = due.state === 'none' || due.state === 'fine';
  const gap = open ? MOST_VOID : Math.max(due.state === 'soon' ? 4 : 0, due.left * MOST_VOID);
  const length = (WIDTH - gap) / 2;
  return (
    <svg className={`due-mark ${due.state}`} viewBox={`0 0 ${WIDTH} ${HEIGHT}`} aria-hidden="true">
      <rect x="1" y="1" width={length - 2} height={HEIGHT - 2} />
      <rect x={WIDTH - length + 1} y="1" width={length - 2} height={HEIGHT - 2} />
      {due.state === 'failed' ? <path d={hatch()} /> : null}
    </svg>
  );
}

function hatch(): string {
  return [6, 18, 30, 42, 54].map((x) => `M${x} 0L${x - 12} ${HEIGHT}`).join('');
}
