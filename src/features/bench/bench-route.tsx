import { useNavigate, useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { paths } from '../../config/paths';
import { useLab, useRig } from '../../data/use-book';
import { useDeclared } from '../../data/use-now';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabDoc } from '../../domain/book/documents/lab';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { BenchMark } from './bench-mark';
import { BenchPins } from './bench-pins';
import { BenchRooms } from './bench-rooms';
import { BenchSide } from './bench-side';
import { BenchActsInFigure, BenchThumbs } from './bench-thumbs';
import './bench.css';

export function BenchRoute() {
  const { rig: id } = useParams();
  const rig = useRig(id ?? '');
  const view = useDeclared(id ?? '');
  const lab = useLab();
  const navigate = useNavigate();
  if (rig === undefined || view === undefined || lab === undefined) {
    return (
      <Screen>
        <SaysBlock lead="This rig is not in the tablet’s Book.">
          The Book may still be filling.{' '}
          <a href={paths.rigs()} onClick={(event) => (event.preventDefault(), void navigate(paths.rigs()))}>
            Choose a rig
          </a>
        </SaysBlock>
      </Screen>
    );
  }
  return <Bench rig={rig} view={view} lab={lab} />;
}

function Bench({
  rig,
  view,
  lab,
}: {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly lab: LabDoc;
}) {
  return (
    <Screen
      banner={<BenchMark rig={rig} view={view} zone={lab.settings.zone} />}
      thumbs={<BenchThumbs rig={rig} view={view} />}
    >
      <BenchActsInFigure rig={rig} />
      <div className="bench-columns">
        <BenchPins rig={rig} revision={latestRevision(rig)} settings={lab.settings} />
        <BenchSide rig={rig} view={view} zone={lab.settings.zone} />
        <BenchRooms rig={rig.id} />
      </div>
    </Screen>
  );
}
