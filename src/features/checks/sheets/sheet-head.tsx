import { Choice } from '../../../components/choice';
import { WordsField } from '../../../components/words-field';
import { PURPOSES } from '../../../domain/book/sheet-spec';
import { PURPOSE_WORDS, TOPOLOGY_WORDS } from '../../../domain/report/words';
import { Ticks } from './ticks';
import type { SheetEdit } from './use-sheet-edit';

const TOPOLOGIES = ['lc-inversion', 'charge-transfer'] as const;

/** What the sheet is, which rigs it is for, and what can hurt while it is walked. */
export function SheetHead({ edit }: { readonly edit: SheetEdit }) {
  const { draft, change, rigs } = edit;
  return (
    <section aria-label="Sheet" className="sheet-section">
      <WordsField
        label="Title"
        rows={1}
        maxLength={120}
        value={draft.title}
        onChange={(title) => change({ title })}
      />
      <Choice
        label="What it is for"
        options={PURPOSES.map((value) => ({ value, label: PURPOSE_WORDS[value] }))}
        value={draft.purpose}
        onChange={(purpose) => change({ purpose })}
      />
      <Ticks
        label="Circuits"
        options={TOPOLOGIES.map((value) => ({ value, label: TOPOLOGY_WORDS[value] }))}
        chosen={draft.topologies}
        onChange={(topologies) => change({ topologies })}
      />
      <Ticks
        label="Rigs"
        hint={draft.rigs.length === 0 ? 'none chosen: every rig of these circuits' : 'these alone'}
        options={rigs.map((rig) => ({ value: rig.id, label: rig.name }))}
        chosen={draft.rigs}
        onChange={(chosen) => change({ rigs: chosen })}
      />
      <WordsField
        label="Caution"
        hint="stands above the sheet: what can hurt while it is walked"
        rows={3}
        value={draft.caution}
        onChange={(caution) => change({ caution })}
      />
    </section>
  );
}
