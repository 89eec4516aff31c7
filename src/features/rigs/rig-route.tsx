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
import { rigView } from './figures-view';
import { RigFigure } from './rig-figure';
import './rigs.css';

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

function RigScreen({ rig, settings }: { readonly rig: RigDoc; readonly settings: LabSettings }) {
  const navigate = useNavigate();
  const revision = latestRevision(rig);
  const view = rigView(revision.spec, settings);
  return (
    <Screen
      fields={
        <FieldColumn label="Derived">
          {view.rows.map((row) => (
            <FieldRow
              key={row.key}
              label={row.label}
              source={row.source}
              value={row.value}
              unit={row.unit}
              {...(row.refusal === null ? {} : { refusal: row.refusal })}
            />
          ))}
        </FieldColumn>
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
