import { useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { useLab, useRig } from '../../data/use-book';
import type { LabDoc } from '../../domain/book/documents/lab';
import type { RigDoc } from '../../domain/book/documents/rig';
import { GapFields } from './gap-fields';
import { GapFigure } from './gap-figure';
import { GapKeypad } from './gap-keypad';
import { GapThumbs } from './gap-thumbs';
import { useGapLookup } from './use-gap-lookup';
import './gap.css';

export function GapRoute() {
  const { rig: id } = useParams();
  const rig = useRig(id ?? '');
  const lab = useLab();
  if (rig === undefined) {
    return (
      <Screen>
        <SaysBlock lead="No such rig here.">
          It is not in this tablet’s Book. Choose another under Rigs.
        </SaysBlock>
      </Screen>
    );
  }
  return <GapLookupScreen key={rig.id} rig={rig} lab={lab} />;
}

function GapLookupScreen({ rig, lab }: { readonly rig: RigDoc; readonly lab: LabDoc | undefined }) {
  const lookup = useGapLookup(rig, lab);
  const fields = <GapFields lookup={lookup} />;
  // On a phone the keypad needs the thumb zone's place.
  if (lookup.form.typing !== null) {
    return (
      <Screen fields={fields}>
        <GapKeypad lookup={lookup} />
      </Screen>
    );
  }
  return (
    <Screen fields={fields} thumbs={<GapThumbs rig={rig} lookup={lookup} />}>
      <GapFigure rig={rig} lookup={lookup} />
    </Screen>
  );
}
