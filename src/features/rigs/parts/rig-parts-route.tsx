import { useNavigate, useParams } from 'react-router-dom';
import { Screen } from '../../../components/frame';
import { SaysBlock } from '../../../components/says-block';
import { ThumbDome } from '../../../components/thumb-dome';
import { ThumbZone } from '../../../components/thumb-zone';
import { paths } from '../../../config/paths';
import { useRig } from '../../../data/use-book';
import type { RigDoc } from '../../../domain/book/documents/rig';
import { useMay } from '../use-may';
import { FitPart } from './fit-part';
import { PartList } from './part-list';
import { RetirePart } from './retire-part';
import { useRigParts, type RigParts } from './use-rig-parts';
import '../rigs.css';
import '../edit/edit.css';

/** What is fitted to a rig and since when, and what each part has endured. */
export function RigPartsRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  if (rig === undefined)
    return (
      <Screen>
        <div className="rig-page">
          <SaysBlock lead="This rig is not in the tablet’s Book.">It may still be filling.</SaysBlock>
        </div>
      </Screen>
    );
  return <Parts key={rig.id} rig={rig} />;
}

function Parts({ rig }: { readonly rig: RigDoc }) {
  const parts = useRigParts(rig);
  return (
    <Screen thumbs={<PartThumbs key={parts.view} parts={parts} />} fields={<span />}>
      <div className="rig-page">
        <div className="rig-head">
          <h1>Parts of {rig.name}</h1>
          <span className="muted">what each has endured since it was fitted</span>
        </div>
        {parts.view === 'fit' ? <FitPart parts={parts} /> : null}
        {parts.view === 'retire' ? <RetirePart parts={parts} /> : null}
        {parts.view === 'list' ? <PartList parts={parts} /> : null}
      </div>
    </Screen>
  );
}

// Keyed by the view where it is used: a thumb that lets go after a hold must not press the dome that has come under it.
function PartThumbs({ parts }: { readonly parts: RigParts }) {
  const navigate = useNavigate();
  const may = useMay();
  const { view, setView, read, part, retire } = parts;
  const back = <ThumbDome key="back" label="Back to the parts" onComplete={() => setView('list')} />;
  if (view === 'fit')
    return (
      <ThumbZone
        label="Actions"
        main={
          <ThumbDome
            size="big"
            hold="half-second"
            label={'Hold\nto fit'}
            holdLabel="Hold: fit the part"
            disabled={!read.ok}
            {...(read.ok ? {} : { reason: read.words })}
            onComplete={parts.logFit}
          />
        }
        others={[back]}
      />
    );
  if (view === 'retire') {
    const said = retire.value.why.trim() !== '';
    return (
      <ThumbZone
        label="Actions"
        main={
          <ThumbDome
            size="big"
            hold="second"
            critical
            label={'Hold\nto retire'}
            holdLabel="Hold: retire the part"
            disabled={!said}
            {...(said ? {} : { reason: 'Say why it is retired.' })}
            onComplete={parts.logRetire}
          />
        }
        others={[back]}
      />
    );
  }
  const allowed = may('part.fitted');
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          label="Fit a part"
          disabled={!allowed}
          {...(allowed ? {} : { reason: 'Parts are fitted by operators, reviewers and leads.' })}
          onComplete={() => setView('fit')}
        />
      }
      others={[
        <ThumbDome
          key="rig"
          label="Back to the rig"
          onComplete={() => void navigate(paths.rig(parts.rig.id))}
        />,
        ...(part !== null && part.retired === null && allowed
          ? [<ThumbDome key="retire" label="Retire it" onComplete={() => setView('retire')} />]
          : []),
      ]}
    />
  );
}
