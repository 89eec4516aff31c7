import { Link, useNavigate, useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import type { HoldOutcome } from '../../components/hold';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useAppend } from '../../data/use-append';
import { useFirings, useLab, useRig } from '../../data/use-book';
import { useDraft } from '../../data/use-draft';
import { useNow, useReadiness } from '../../data/use-now';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { RigDoc } from '../../domain/book/documents/rig';
import { standingPermit, type Missing } from '../../domain/rules/readiness';
import { openingBody } from './opening-body';
import { ReadinessPanel, ReadyWords } from './readiness-panel';
import './firings.css';

/** Says what is missing before the first shot; with nothing missing a firing opens, otherwise only its record. */
export function OpenFiringRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  const missing = useReadiness(id);
  const open = useFirings(id).find((firing) => firing.closed === null);
  if (rig === undefined || missing === undefined) {
    return (
      <Screen>
        <div className="firing-figure">
          <SaysBlock lead="This rig is not in the tablet’s Book.">The Book may still be filling.</SaysBlock>
        </div>
      </Screen>
    );
  }
  return open === undefined ? <Opening rig={rig} missing={missing} /> : <AlreadyOpen rig={rig} open={open} />;
}

interface OpeningProps {
  readonly rig: RigDoc;
  readonly missing: readonly Missing[];
}

function Opening({ rig, missing }: OpeningProps) {
  const append = useAppend();
  const navigate = useNavigate();
  const { best_ms } = useNow();
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const why = useDraft(`unready/${rig.id}`, '');
  const permit = standingPermit(rig, best_ms);

  const open = async (reason: string | null): Promise<HoldOutcome> => {
    const body = openingBody(rig, { permit, missing, why: reason });
    if (!body.ok) return { type: 'failed', words: body.refusal.words };
    const outcome = await append({ kind: 'firing.opened', body: body.value });
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    why.clear();
    void navigate(paths.firing(outcome.entry.id));
    return { type: 'settled' };
  };

  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            missing.length === 0 ? (
              <ThumbDome
                size="big"
                label={'Open\nfiring'}
                hold="half-second"
                holdLabel="Hold: open firing"
                onComplete={() => open(null)}
              />
            ) : (
              <ThumbDome
                size="big"
                label={'Record\nas unready'}
                hold="half-second"
                holdLabel="Hold: record as unready"
                onComplete={() => open(why.value)}
              />
            )
          }
        />
      }
    >
      <div className="firing-figure">
        {missing.length === 0 ? (
          <ReadyWords rig={rig} permit={permit} zone={zone} />
        ) : (
          <>
            <ReadinessPanel rig={rig} missing={missing} />
            <UnreadyReason value={why.value} onChange={why.set} />
          </>
        )}
      </div>
    </Screen>
  );
}

interface UnreadyReasonProps {
  readonly value: string;
  readonly onChange: (words: string) => void;
}

function UnreadyReason({ value, onChange }: UnreadyReasonProps) {
  return (
    <label className="firing-reason">
      <span>Reason for recording it as unready</span>
      <textarea
        className="firing-words"
        rows={3}
        maxLength={2000}
        value={value}
        onChange={(event) => {
          onChange(event.target.value);
        }}
      />
      <span className="muted">
        The reviewer is told. Its readings are kept and never used for calibration. Holdoff stops nothing: it
        only says what is missing.
      </span>
    </label>
  );
}

function AlreadyOpen({ rig, open }: { readonly rig: RigDoc; readonly open: FiringDoc }) {
  const navigate = useNavigate();
  const there = paths.firing(open.id);
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={`Go on\nwith ${open.number}`}
              onComplete={() => void navigate(there)}
            />
          }
        />
      }
    >
      <div className="firing-figure">
        <SaysBlock lead={`Firing ${open.number} is open on ${rig.name}.`}>
          Close it before another is opened. <Link to={there}>Go on with {open.number}</Link>
        </SaysBlock>
      </div>
    </Screen>
  );
}
