import { ChannelDrawing } from '../../components/channel-drawing';
import { Choice } from '../../components/choice';
import { LOOK_WORDS } from '../../domain/report/words';
import { arcsOf, CHANNEL_PARTS, lookRowFor, rowOf, toggleArc, type ChannelPartKey } from './looks';
import type { ReadingForm } from './use-reading-form';

/** What the discharge looked like, drawn where it was: a touch on an end says that an arc sat there. */
export function LookedChoice({
  form,
  length_mm,
}: {
  readonly form: ReadingForm;
  readonly length_mm: number;
}) {
  const { looked } = form.values;
  return (
    <>
      <ChannelDrawing
        label={`How it looked: ${looked === null ? 'not said yet' : LOOK_WORDS[looked]}`}
        parts={CHANNEL_PARTS}
        arcs={arcsOf(looked)}
        even={looked === 'even'}
        length_mm={length_mm}
        onToggle={(key) => {
          if (isPart(key)) form.pick('looked', toggleArc(looked, key));
        }}
      />
      <Choice
        label="How it looked"
        options={lookRowFor(looked)}
        value={rowOf(looked)}
        onChange={(row) => {
          if (row === 'failed') form.open('looked');
          else form.pick('looked', row);
        }}
      />
      {form.refusal?.field === 'looked' ? (
        <p className="field-refusal" role="alert">
          {form.refusal.words}
        </p>
      ) : null}
    </>
  );
}

function isPart(key: string): key is ChannelPartKey {
  return CHANNEL_PARTS.some((part) => part.key === key);
}
