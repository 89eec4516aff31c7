import { useNavigate, useParams } from 'react-router-dom';
import { FieldColumn } from '../../components/field-column';
import { FieldRow } from '../../components/field-row';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useLab, useRig } from '../../data/use-book';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabSettings } from '../../domain/book/rig-spec';
import type { RigDerived } from '../../domain/rules/rig-derived';
import { DerivedRows } from './derived-rows';
import { derivedRows } from '../../domain/report/derived-rows';
import { RigFigure } from './rig-figure';
import { useRigDerived } from './use-rig-derived';
import { secondsText } from './wait-list';
import './rigs.css';
import './edit/edit.css';

/** One rig: what it is, what it can hold, and what it must not be trusted with. */
export function RigRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  const lab = useLab();
  if (rig === undefined || lab === undefined) {
    return (
      <Screen>
        <div className="rig-page">
          <SaysBlock lead="This rig is not in the tablet’s Book.">
            The Book may still be filling. The others stand under Rigs.
          </SaysBlock>
        </div>
      </Screen>
    );
  }
  return <RigScreen rig={rig} settings={lab.settings} />;
}

const KEY_FIGURES = ['stored', 'stress_first', 'rate', 'reach'] as const;

function RigScreen({ rig, settings }: { readonly rig: RigDoc; readonly settings: LabSettings }) {
  const navigate = useNavigate();
  const { spec } = latestRevision(rig);
  const view = useRigDerived(spec, settings);
  if (view === null) return null;
  return (
    <Screen
      fields={
        <>
          <DerivedRows label="Derived" spec={spec} rows={derivedRows(view.derived, KEY_FIGURES)} />
          <FieldColumn label="Wait">
            <WaitRow wait={view.derived.wait} />
          </FieldColumn>
        </>
      }
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'Use in\nlookups'}
              onComplete={() => void navigate(paths.gapLookup(rig.id))}
            />
          }
          others={[
            <ThumbDome
              key="revise"
              label="Revise"
              onComplete={() => void navigate(paths.reviseRig(rig.id))}
            />,
          ]}
        />
      }
    >
      <RigFigure rig={rig} view={view} settings={settings} />
    </Screen>
  );
}

function WaitRow({ wait }: { readonly wait: RigDerived['wait'] }) {
  if (!wait.ok)
    return (
      <FieldRow label="Wait" source="before the stick" value={null} unit="s" refusal={wait.refusal.words} />
    );
  if (wait.value.type === 'unknown')
    return (
      <FieldRow
        label="Wait"
        source="before the stick"
        value={null}
        unit="s"
        refusal="A bleed is not known: no number."
      />
    );
  const { wait_s, computed_s } = wait.value;
  return (
    <FieldRow label="Wait" source={`bleeds in ${secondsText(computed_s)}`} value={String(wait_s)} unit="s" />
  );
}
