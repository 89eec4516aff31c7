import { useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { useRig } from '../../data/use-book';
import type { RigDoc } from '../../domain/book/documents/rig';
import { EditScreen } from './edit/edit-screen';
import { useRigEdit } from './edit/use-rig-edit';
import './rigs.css';
import './edit/edit.css';

export function ReviseRigRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  if (rig === undefined) {
    return (
      <Screen>
        <div className="rig-page">
          <SaysBlock lead="This rig is not in the tablet’s Book.">Nothing can be revised here.</SaysBlock>
        </div>
      </Screen>
    );
  }
  return <ReviseRig key={rig.id} rig={rig} />;
}

function ReviseRig({ rig }: { readonly rig: RigDoc }) {
  const edit = useRigEdit(rig);
  return <EditScreen edit={edit} />;
}
