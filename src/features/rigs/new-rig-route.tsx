import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { EditScreen } from './edit/edit-screen';
import { useRigEdit } from './edit/use-rig-edit';
import { useMay } from './use-may';
import './rigs.css';
import './edit/edit.css';

/** A rig from nothing, or from a copy of another: one section after the other, to a simulated waveform and revision 1. */
export function NewRigRoute() {
  const may = useMay();
  if (!may('rig.created'))
    return (
      <Screen>
        <div className="rig-page">
          <SaysBlock lead="A new rig is for operators, reviewers and leads.">
            Readers see the rigs that there are.
          </SaysBlock>
        </div>
      </Screen>
    );
  return <NewRig />;
}

function NewRig() {
  const edit = useRigEdit(null);
  return <EditScreen edit={edit} />;
}
