import { useState } from 'react';
import { Dialog } from '../../components/dialog';
import { HoldButton } from '../../components/hold-button';
import { WordsField } from '../../components/words-field';
import { useDraft } from '../../data/use-draft';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { StampPoint } from '../../domain/book/stamp';
import { clockWords } from '../../domain/report/time-words';
import { heldFor } from './people-words';
import type { PeopleActs } from './use-people-acts';

type Tag = RigDoc['hands'][number];

interface Props {
  readonly rig: RigDoc;
  readonly acts: PeopleActs;
  readonly me: string | null;
  readonly nameOf: (id: string | null) => string;
  readonly zone: string;
  readonly now: StampPoint;
}

/** Every tag on the rig: whose, where, since when. One's own comes off by a hold, somebody else's only with words. */
export function HandsList(props: Props) {
  const { rig, nameOf } = props;
  const [taking, setTaking] = useState<Tag | null>(null);
  return (
    <section aria-label="Hands in">
      <h2>Hands in</h2>
      {rig.hands.length === 0 ? (
        <p className="muted">No tags in.</p>
      ) : (
        <ul className="bench-rows">
          {rig.hands.map((tag) => (
            <TagRow key={tag.entry} tag={tag} {...props} onTake={() => setTaking(tag)} />
          ))}
        </ul>
      )}
      {taking === null ? null : (
        <TakeOut tag={taking} name={nameOf(taking.by)} acts={props.acts} onClose={() => setTaking(null)} />
      )}
    </section>
  );
}

function TagRow({
  tag,
  acts,
  me,
  nameOf,
  zone,
  now,
  onTake,
}: Props & { readonly tag: Tag; readonly onTake: () => void }) {
  const name = nameOf(tag.by);
  return (
    <li className="bench-row">
      <span>
        <b>{name}</b>
        {tag.where === '' ? '' : `, ${tag.where}`}
        <br />
        <span className="muted">
          {heldFor(tag.stamp, now)}, since {clockWords(tag.stamp.wall_ms, zone)}
        </span>
      </span>
      {tag.by === me ? (
        <HoldButton
          label="Hands out"
          hold="second"
          holdLabel="Hold: hands out"
          onComplete={() => acts.handsOut(tag.entry)}
        />
      ) : (
        <HoldButton label={`Take out ${name}’s tag`} onComplete={onTake} />
      )}
    </li>
  );
}

/** A tag that vanishes without a reason protects nobody: words first, then the hold. */
function TakeOut({
  tag,
  name,
  acts,
  onClose,
}: {
  readonly tag: Tag;
  readonly name: string;
  readonly acts: PeopleActs;
  readonly onClose: () => void;
}) {
  const words = useDraft(`tag/${tag.entry}`, '');
  const [refusal, setRefusal] = useState<string | null>(null);
  const take = async () => {
    const outcome =
      words.value.trim() === ''
        ? ({ type: 'failed', words: 'Say why it may come off.' } as const)
        : await acts.handsOut(tag.entry, words.value);
    if (outcome.type === 'failed') setRefusal(outcome.words);
    else {
      words.clear();
      onClose();
    }
    return outcome;
  };
  return (
    <Dialog
      title={`Take out the tag of ${name}`}
      closeLabel="Leave it on"
      onClose={onClose}
      actions={<HoldButton label="Hold to take it out" hold="second" main onComplete={take} />}
    >
      <p>Look first: no hands, no tools. {name} and the reviewers can read what stands here.</p>
      <WordsField
        label="Why it may come off, and how you made sure"
        value={words.value}
        onChange={(text) => {
          setRefusal(null);
          words.set(text);
        }}
        {...(refusal === null ? {} : { refusal })}
      />
    </Dialog>
  );
}
