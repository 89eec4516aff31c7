import { Link } from 'react-router-dom';
import { AgeScale } from '../../components/age-scale';
import { Reading } from '../../components/reading';
import { WideMark } from '../../components/wide-mark';
import { paths } from '../../config/paths';
import { useAuthor } from '../../data/use-author';
import { useNames } from '../../data/use-names';
import { useNow } from '../../data/use-now';
import type { RigDoc } from '../../domain/book/documents/rig';
import { DECLARED_WORDS } from '../../domain/report/words';
import { ageWords, clockWords } from '../../domain/report/time-words';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { peopleWords } from './people-words';
import { stripState } from './strip-state';

interface Props {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly zone: string;
}

const HOUR_MS = 3_600_000;

/** The gap mark as wide as the screen: what was declared lies between its faces. */
export function BenchMark({ rig, view, zone }: Props) {
  const drawn = stripState(view);
  const age = view.age_ms;
  const known = view.state !== 'not-known';
  return (
    <div className="bench-mark" role="status">
      <WideMark
        state={drawn.mark}
        hatched={drawn.hatched}
        title={
          <div className={`bench-mark-words ${view.state}`}>
            <b>{DECLARED_WORDS[view.state]}</b>
            {known && age !== null ? <AgeFigure age_ms={age} /> : null}
          </div>
        }
      >
        <AgeScale age_h={known && age !== null ? age / HOUR_MS : null} steps={48} variant="face" />
        <p className="bench-mark-detail">
          <span>
            <Declarer rig={rig} view={view} zone={zone} /> <PeopleLine rig={rig} />
          </span>
          <span className="muted">{known ? 'at 12 h: not known, treat as charged' : ''}</span>
        </p>
      </WideMark>
    </div>
  );
}

function AgeFigure({ age_ms }: { readonly age_ms: number }) {
  const [value = '', unit = ''] = ageWords(age_ms).split(' ');
  return <Reading value={value} unit={unit} size="answer" />;
}

function Declarer({ rig, view, zone }: Props) {
  const name = useAuthor(rig, view.trace);
  const [first] = view.stood_down;
  const down = useAuthor(rig, first ?? null);
  const stoodDown = first === undefined ? '' : ` Stood down by ${down}: ${first.why}.`;
  if (view.trace === null) return <>Nothing declared yet.{stoodDown}</>;
  const when = clockWords(view.trace.stamp.wall_ms, zone);
  if (view.state !== 'not-known') {
    return (
      <>
        {capital(name)}, {when}. Declared, not measured.{stoodDown}
      </>
    );
  }
  const why = view.why ?? '';
  return (
    <>
      {capital(why)}. Last by {name}, {when}.{stoodDown}
    </>
  );
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** Whose hands are in and who is checked in; leads to where tags come off. */
function PeopleLine({ rig }: { readonly rig: RigDoc }) {
  const nameOf = useNames();
  const { stamp } = useNow(10_000);
  const words = peopleWords(rig, nameOf, stamp);
  return (
    <Link to={paths.people(rig.id)} className="bench-people">
      {rig.hands.length === 0 ? words : <b>{words}</b>}
    </Link>
  );
}
