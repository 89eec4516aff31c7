import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { TwoFaces } from '../../components/two-faces';
import { paths } from '../../config/paths';
import type { LookupReply } from '../../data/lookup/lookup-protocol';
import { useNow } from '../../data/use-now';
import type { LookupDoc } from '../../domain/book/documents/lookup';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabSettings } from '../../domain/book/rig-spec';
import { figureLine } from '../../domain/lookup/figure-text';
import { readKept, type Kept } from '../../domain/lookup/kept';
import type { Figure, Lookup, LookupAnswer, StartFrom } from '../../domain/lookup/lookup';
import { standingPermit } from '../../domain/rules/readiness';
import type { Result } from '../../domain/units/result';
import { pinAsk, whatIfs } from './pin-ask';
import { useLookupOf } from './use-lookup-of';
import { usePinReply } from './use-pin-reply';

interface Props {
  readonly rig: RigDoc;
  readonly settings: LabSettings;
  readonly docs: readonly LookupDoc[];
}

/** What a person pinned, answered anew from the rig's present revision. Comes by itself, since it brings every lookup along. */
export function PinnedLookups({ rig, settings, docs }: Props) {
  const { best_ms } = useNow(60_000);
  const envelope = standingPermit(rig, best_ms)?.envelope ?? null;
  const { spec } = latestRevision(rig);
  const from = useMemo((): StartFrom => ({ spec, settings, envelope }), [spec, settings, envelope]);
  return docs.map((doc) => <Pin key={doc.id} rig={rig} doc={doc} from={from} />);
}

function Pin({
  rig,
  doc,
  from,
}: {
  readonly rig: RigDoc;
  readonly doc: LookupDoc;
  readonly from: StartFrom;
}) {
  const kept = useMemo(() => readKept(doc.kept), [doc]);
  const lookup = useLookupOf(doc.kept.lookup);
  if (lookup === undefined) return <div className="bench-pin" />;
  if (kept === null || lookup === null) {
    return (
      <Link className="bench-pin" to={paths.lookupsOf(rig.id)}>
        <span className="muted">Pinned: {doc.kept.lookup}</span>
        <span>Another version of the app kept it. Pin it anew.</span>
      </Link>
    );
  }
  return <ReadablePin rig={rig} lookup={lookup} kept={kept} from={from} />;
}

interface ReadablePinProps {
  readonly rig: RigDoc;
  readonly lookup: Lookup;
  readonly kept: Kept;
  readonly from: StartFrom;
}

function ReadablePin({ rig, lookup, kept, from }: ReadablePinProps) {
  const ask = useMemo(() => pinAsk(lookup, kept, from), [lookup, kept, from]);
  const reply = usePinReply(lookup, ask);
  const ifs = whatIfs(lookup, kept);
  return (
    <Link className="bench-pin" to={paths.lookup(lookup.key, rig.id)}>
      <span className="muted">
        {lookup.title}
        {ifs.length === 0 ? '' : `, what if: ${ifs.join(', ').toLowerCase()}`}
      </span>
      {reply === null ? (
        <span className="muted">computing</span>
      ) : (
        <Answered lookup={lookup} kept={kept} reply={reply} />
      )}
    </Link>
  );
}

function Answered({
  lookup,
  kept,
  reply,
}: {
  readonly lookup: Lookup;
  readonly kept: Kept;
  readonly reply: Result<LookupReply>;
}) {
  if (!reply.ok) return <span>{reply.refusal.words}</span>;
  if (reply.value.kind !== 'answer') return null;
  const { answer, found } = reply.value;
  const caution = answer.warnings[0]?.words ?? answer.cautions[0];
  return (
    <>
      {found === null ? (
        <Figures title={lookup.title} answer={answer} />
      ) : (
        <FoundValue lookup={lookup} kept={kept} value={found.value} />
      )}
      {caution === undefined ? null : <span className="bench-pin-caution">{caution}</span>}
    </>
  );
}

function FoundValue({
  lookup,
  kept,
  value,
}: {
  readonly lookup: Lookup;
  readonly kept: Kept;
  readonly value: number;
}) {
  const field = lookup.fields.find((one) => one.key === kept.find?.field);
  const figure = lookup.solvable.find((one) => one.field === kept.find?.field);
  if (field?.kind !== 'number') return null;
  const rounded = { value, digits: 3, decimals: field.decimals, rounding: figure?.rounding ?? 'nearest' };
  return (
    <span className="bench-pin-row">
      <Reading value={figureLine(rounded)} unit={field.unit} size="pin" />
      <span className="muted">{field.label.toLowerCase()}, found</span>
    </span>
  );
}

function Figures({ title, answer }: { readonly title: string; readonly answer: LookupAnswer }) {
  const face = (which: Figure['face']) => answer.figures.find((one) => one.face === which);
  const low = face('low');
  const high = face('high');
  const law = face('law');
  if (low !== undefined && high !== undefined && low.words === undefined && high.words === undefined) {
    return (
      <TwoFaces
        label={title}
        low={figureLine(low)}
        high={figureLine(high)}
        unit={high.unit}
        {...(law === undefined ? {} : { middle: figureLine(law) })}
      />
    );
  }
  const [main, second] = inWeight(answer.figures);
  return (
    <span className="bench-pin-row">
      {main === undefined ? null : <Shown figure={main} />}
      {second === undefined ? null : (
        <span className="muted">
          {second.label.toLowerCase()} {second.words ?? `${figureLine(second)}\u2009${second.unit}`}
        </span>
      )}
      {main === undefined ? <span>{answer.says ?? ''}</span> : null}
    </span>
  );
}

function Shown({ figure }: { readonly figure: Figure }) {
  if (figure.words !== undefined) return <b>{figure.words}</b>;
  return (
    <span>
      <Reading value={figureLine(figure)} unit={figure.unit} size="pin" />{' '}
      <span className="muted">{figure.label.toLowerCase()}</span>
    </span>
  );
}

const WEIGHTS: readonly Figure['weight'][] = ['answer', 'main', 'side'];

function inWeight(figures: readonly Figure[]): readonly Figure[] {
  return figures.toSorted((a, b) => WEIGHTS.indexOf(a.weight) - WEIGHTS.indexOf(b.weight));
}
