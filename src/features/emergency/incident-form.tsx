import { WordsField } from '../../components/words-field';
import type { Emergency, IncidentDraft } from './use-emergency';

/** What happened, who was near, what was made safe. Only the first is needed; the rest can be asked later. */
export function IncidentForm({ emergency }: { readonly emergency: Emergency }) {
  const { rig, draft } = emergency;
  const field = (key: keyof IncidentDraft) => ({
    value: draft.value[key],
    onChange: (text: string) => draft.set((now) => ({ ...now, [key]: text })),
  });
  return (
    <section className="emergency-form" aria-label="Incident">
      <h1>Incident{rig === undefined ? '' : ` at ${rig.name}`}</h1>
      <WordsField label="What happened" rows={3} {...field('what')} />
      <WordsField label="Who was near" {...field('near')} />
      <WordsField label="What was made safe" {...field('made_safe')} />
      <p className="muted">
        Reporting it stands the rig down by itself. What is typed here is kept as a draft at every key
        {draft.save === 'not-saved' ? ', but could not be saved just now' : ''}.
      </p>
    </section>
  );
}
