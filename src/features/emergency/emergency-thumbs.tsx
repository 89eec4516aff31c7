import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import type { Emergency } from './use-emergency';

export function EmergencyThumbs({ emergency }: { readonly emergency: Emergency }) {
  return emergency.reporting ? <ReportThumbs emergency={emergency} /> : <CardThumbs emergency={emergency} />;
}

function CardThumbs({ emergency }: { readonly emergency: Emergency }) {
  const { rig, retract_s, said } = emergency;
  const others = [
    <ThumbDome
      key="make-safe"
      label="Make-safe sheet"
      disabled={rig === undefined}
      onComplete={emergency.openMakeSafe}
    />,
    <ThumbDome
      key="report"
      label="Report an incident"
      disabled={rig === undefined}
      onComplete={() => emergency.setReporting(true)}
    />,
  ];
  if (retract_s !== null) {
    return (
      <>
        <Said words={said} />
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              critical
              hold="second"
              label={`Take it back\n${retract_s}\u2009s left`}
              holdLabel="Hold: take the stand-down back"
              onComplete={emergency.retract}
            />
          }
          others={others}
        />
      </>
    );
  }
  return (
    <>
      <Said words={said} />
      <ThumbZone
        label="Actions"
        main={
          <ThumbDome
            size="big"
            critical
            hold="second"
            label={rig === undefined ? 'Stand\nrig down' : `Stand rig down:\n${rig.name}`}
            holdLabel={rig === undefined ? 'Hold: stand down' : `Hold: stand ${rig.name} down`}
            disabled={rig === undefined}
            onComplete={emergency.standDown}
          />
        }
        others={others}
      />
    </>
  );
}

function ReportThumbs({ emergency }: { readonly emergency: Emergency }) {
  const empty = emergency.draft.value.what.trim() === '';
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          critical
          hold="second"
          label={'Hold\nto report'}
          holdLabel="Hold: report the incident"
          disabled={empty}
          {...(empty ? { reason: 'Say what happened.' } : {})}
          onComplete={emergency.report}
        />
      }
      others={[
        <ThumbDome key="back" label="Back to the card" onComplete={() => emergency.setReporting(false)} />,
      ]}
    />
  );
}

function Said({ words }: { readonly words: string | null }) {
  return (
    <p className="emergency-said" role="status">
      {words}
    </p>
  );
}
