import { DECLARED_WORDS } from '../../domain/report/words';
import type { DeclaredView } from '../../domain/rules/declared-view';

type Mark = 'bridged' | 'open' | 'dashed' | 'jagged';
type Ground = 'outline' | 'half' | 'solid' | 'dash';

const MARKS: Readonly<Record<DeclaredView['state'], { readonly mark: Mark; readonly ground: Ground }>> = {
  shorted: { mark: 'bridged', ground: 'outline' },
  'short-off': { mark: 'open', ground: 'half' },
  firing: { mark: 'jagged', ground: 'solid' },
  'not-known': { mark: 'dashed', ground: 'dash' },
};

/** How the declared state is drawn and said. Stood down stands beside what was declared, never instead of it. */
export function stripState(view: DeclaredView) {
  const stoodDown = view.stood_down.length > 0;
  const words = DECLARED_WORDS[view.state];
  return {
    ...MARKS[view.state],
    hatched: stoodDown,
    words: stoodDown ? `${words}, stood down` : words,
    short: view.state === 'not-known' ? 'Not known' : words,
  };
}
