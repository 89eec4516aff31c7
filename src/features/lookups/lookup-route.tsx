import { useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { useLab, useRig } from '../../data/use-book';
import type { LabDoc } from '../../domain/book/documents/lab';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { Lookup } from '../../domain/lookup/lookup';
import { lookupOf } from '../../domain/lookup/lookups';
import { LookupFields } from './lookup-fields';
import { LookupFigure } from './lookup-figure';
import { numberOf } from './lookup-form';
import { LookupKeypad } from './lookup-keypad';
import { LookupThumbs } from './lookup-thumbs';
import { useLookup } from './use-lookup';
import './lookup.css';

/** Any lookup, of the rig in the address or of none. */
export function LookupRoute() {
  const { lookup: key, rig: id } = useParams();
  const lookup = lookupOf(key ?? '');
  const rig = useRig(id ?? '');
  const lab = useLab();
  if (lookup === undefined) {
    return (
      <Screen>
        <SaysBlock lead="There is no such lookup.">Choose another under Lookups.</SaysBlock>
      </Screen>
    );
  }
  if (id !== undefined && rig === undefined) {
    return (
      <Screen>
        <SaysBlock lead="No such rig here.">
          It is not in this tablet’s Book. Choose another under Rigs.
        </SaysBlock>
      </Screen>
    );
  }
  return <LookupScreen key={`${lookup.key}/${id ?? ''}`} lookup={lookup} rig={rig} lab={lab} />;
}

interface Props {
  readonly lookup: Lookup;
  readonly rig: RigDoc | undefined;
  readonly lab: LabDoc | undefined;
}

function LookupScreen({ lookup, rig, lab }: Props) {
  const view = useLookup(lookup, rig, lab);
  const typed = view.form.typing === null ? undefined : numberOf(lookup, view.form, view.form.active);
  const fields = <LookupFields view={view} />;
  // On a phone the keypad needs the thumb zone's place.
  if (typed !== undefined) {
    return (
      <Screen fields={fields}>
        <LookupKeypad view={view} field={typed} />
      </Screen>
    );
  }
  return (
    <Screen fields={fields} thumbs={<LookupThumbs view={view} />}>
      <LookupFigure view={view} />
    </Screen>
  );
}
