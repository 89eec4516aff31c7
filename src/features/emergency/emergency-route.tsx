import { useState } from 'react';
import { Choice } from '../../components/choice';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { RIG_IN_HAND_KEY } from '../../config/rig-in-hand';
import { useLab, useRigs } from '../../data/use-book';
import type { RigDoc } from '../../domain/book/documents/rig';
import { likelyRig } from './emergency-rig';
import { EmergencyCard } from './emergency-card';
import { EmergencyThumbs } from './emergency-thumbs';
import { IncidentForm } from './incident-form';
import { useEmergency } from './use-emergency';
import './emergency.css';

/** Opens before any PIN and without a network: it stands on the mirror alone. */
export function EmergencyRoute() {
  const lab = useLab();
  const rigs = useRigs();
  const [chosen, setChosen] = useState<string | null>(null);
  const inHand = chosen ?? window.localStorage.getItem(RIG_IN_HAND_KEY);
  const rig = rigs.find((one) => one.id === chosen) ?? likelyRig(rigs, inHand);
  const emergency = useEmergency(rig);
  return (
    <Screen
      fields={<RigField rigs={rigs} rig={rig} onChoose={setChosen} />}
      thumbs={<EmergencyThumbs emergency={emergency} />}
    >
      <div className="emergency">
        <SaysBlock lead="Holdoff switches nothing.">Switch off by hand, short, then help.</SaysBlock>
        {emergency.reporting ? (
          <IncidentForm emergency={emergency} />
        ) : (
          <EmergencyCard settings={lab?.settings ?? null} />
        )}
        {rig === undefined ? (
          <SaysBlock lead="No rig in this tablet’s Book yet.">
            Nothing can be stood down from here; write it down and log it later.
          </SaysBlock>
        ) : null}
      </div>
    </Screen>
  );
}

interface RigFieldProps {
  readonly rigs: readonly RigDoc[];
  readonly rig: RigDoc | undefined;
  readonly onChoose: (rig: string) => void;
}

/** Which rig it is about, at once in view: a wrong guess of the screen costs one touch. */
function RigField({ rigs, rig, onChoose }: RigFieldProps) {
  if (rigs.length < 2) return null;
  return (
    <div className="emergency-rigs">
      <p className="muted">Which rig</p>
      <Choice
        label="Which rig"
        options={rigs.map((one) => ({ value: one.id, label: one.name }))}
        value={rig?.id ?? null}
        onChange={onChoose}
      />
    </div>
  );
}
