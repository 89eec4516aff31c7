import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { HoldOutcome } from '../../components/hold';
import { paths } from '../../config/paths';
import { useAppend, type AppendOutcome } from '../../data/use-append';
import { useIncidents } from '../../data/use-book';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import { useSession } from '../../data/use-session';
import type { RigDoc } from '../../domain/book/documents/rig';
import { isRetractable, RETRACT_WITHIN_MS } from '../../domain/rules/judge-rigs';
import { elapsedMs } from '../../domain/book/stamp';

export interface IncidentDraft {
  readonly what: string;
  readonly near: string;
  readonly made_safe: string;
}

const EMPTY: IncidentDraft = { what: '', near: '', made_safe: '' };

/** Standing down, reporting and taking back, all of it before a PIN where the rules allow an open author. */
export function useEmergency(rig: RigDoc | undefined) {
  const append = useAppend();
  const navigate = useNavigate();
  const session = useSession();
  const { stamp } = useNow(1000);
  const draft = useDraft<IncidentDraft>(`incident/${rig?.id ?? 'none'}`, EMPTY);
  const [reporting, setReporting] = useState(false);
  const [said, setSaid] = useState<string | null>(null);
  const me = session.state === 'open' ? session.person.id : null;
  const own = rig?.stand_downs.findLast((down) => isRetractable(down, me, stamp));
  const incidents = useIncidents(rig?.id ?? '');
  const age = own === undefined ? null : elapsedMs(own.stamp, stamp);

  const finish = (outcome: AppendOutcome, words: string): HoldOutcome => {
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    setSaid(`${words} ${outcome.copies === 1 ? 'One copy only on this tablet.' : ''}`.trim());
    return { type: 'settled' };
  };

  return {
    rig,
    locked: session.state !== 'open',
    said,
    reporting,
    draft,
    setReporting,
    openMakeSafe: () => {
      if (rig !== undefined) void navigate(paths.checks(rig.id));
    },
    /** Seconds left in which the own stand-down can be taken back; null when there is none. */
    retract_s: age === null ? null : Math.ceil((RETRACT_WITHIN_MS - age) / 1000),
    standDown: async (): Promise<HoldOutcome> => {
      if (rig === undefined) return { type: 'failed', words: 'Choose the rig first.' };
      const outcome = await append({
        kind: 'rig.stood-down',
        subject: rig.id,
        body: { why: 'Stood down from the emergency card' },
      });
      return finish(
        outcome,
        `${rig.name} is stood down: logged. Nobody may fire it until a reviewer returns it.`,
      );
    },
    retract: async (): Promise<HoldOutcome> => {
      if (rig === undefined || own === undefined)
        return { type: 'failed', words: 'The two minutes are over.' };
      // An incident stands its rig down under its own id, and stays in the reviewer's inbox when that is taken back.
      const incident = incidents.find((one) => one.id === own.entry)?.id ?? null;
      const outcome = await append({
        kind: 'rig.stand-down-retracted',
        subject: rig.id,
        body: { stand_down: own.entry, incident },
      });
      return finish(outcome, 'The stand-down is taken back: logged. The reviewer is told.');
    },
    report: async (): Promise<HoldOutcome> => {
      const { what, near, made_safe } = draft.value;
      if (rig === undefined) return { type: 'failed', words: 'Choose the rig first.' };
      if (what.trim() === '') return { type: 'failed', words: 'Say what happened.' };
      const outcome = await append({
        kind: 'incident.reported',
        subject: rig.id,
        body: { what: what.trim(), near: near.trim(), made_safe: made_safe.trim(), stand_down: null },
      });
      const settled = finish(outcome, `The incident is reported: logged. ${rig.name} is stood down with it.`);
      if (settled.type === 'settled') {
        draft.clear();
        setReporting(false);
      }
      return settled;
    },
  };
}

export type Emergency = ReturnType<typeof useEmergency>;
