import { useNavigate } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { paths } from '../../config/paths';
import type { SheetPurpose } from '../../domain/book/sheet-spec';
import { PrintRecord } from './print-record';
import { StepFrame } from './step-frame';
import type { CheckWalk } from './use-check-walk';

/** Every step is done: the check can be closed, and closing it declares. */
export function CloseStep({ walk }: { readonly walk: CheckWalk }) {
  const { sheet, rig, progress } = walk;
  const waived = progress.steps.filter((one) => one.state === 'waived').length;
  const said = CLOSING[sheet.spec.purpose];
  return (
    <StepFrame
      walk={walk}
      main={
        <ThumbDome
          size="big"
          critical
          label={'Close\ncheck'}
          hold="second"
          holdLabel="Hold: close check"
          onComplete={walk.close}
        />
      }
    >
      <h1 className="check-title">Every step is done{waived === 0 ? '' : ` or waived, ${waived} of them`}</h1>
      <p className="check-detail">
        {said.declares === null ? (
          `Closing declares nothing: ${rig.name} stays as it was declared.`
        ) : (
          <>
            Closing declares {rig.name}: <b>{said.declares}</b>, by you, now.
          </>
        )}
      </p>
      <Caution>{said.caution}</Caution>
    </StepFrame>
  );
}

interface Closing {
  readonly declares: 'shorted' | 'short off' | null;
  readonly caution: string;
}

const CLOSING: Readonly<Record<SheetPurpose, Closing>> = {
  'before-firing': {
    declares: 'short off',
    caution:
      'From here on treat it as charged. The check lapses after 30 min without activity, and after 4 h.',
  },
  'make-safe': {
    declares: 'shorted',
    caution: 'A declaration is no measurement. The shorts stay on.',
  },
  'gas-change': {
    declares: null,
    caution: 'The gas was changed: the before-firing check is void and has to be walked again.',
  },
  'dye-handling': {
    declares: null,
    caution: 'Nothing fires while solvent is open in the room. A dye beam needs its own eyewear.',
  },
  'weekly-care': {
    declares: null,
    caution: 'The shorts stay on. The before-firing check is void and has to be walked again.',
  },
};

/** The check has ended: what it declared, and where to go from here. */
export function EndedStep({ walk }: { readonly walk: CheckWalk }) {
  const { check, sheet, rig, nameOf, change } = walk;
  const navigate = useNavigate();
  const { ended } = check;
  if (ended === null) return null;
  const toFire = ended.how === 'closed' && sheet.spec.purpose === 'before-firing';
  return (
    <StepFrame
      walk={walk}
      main={
        toFire ? (
          <ThumbDome
            size="big"
            label={'To\nfiring'}
            onComplete={() => void navigate(paths.openFiring(rig.id))}
          />
        ) : (
          <ThumbDome
            size="big"
            label={'All\nchecks'}
            onComplete={() => void navigate(paths.checks(rig.id))}
          />
        )
      }
      also={
        <ThumbDome
          key="list"
          label="Show the list"
          onComplete={() => {
            change((now) => ({ ...now, list: true }));
          }}
        />
      }
    >
      <h1 className="check-title">
        {ended.how === 'closed' ? 'Closed' : 'Abandoned'} by {nameOf(ended.by)}
      </h1>
      {ended.how === 'abandoned' ? (
        <SaysBlock>{ended.words}</SaysBlock>
      ) : (
        <p className="check-detail">
          {ended.irregular === null
            ? endedWords(sheet.spec.purpose, rig.name)
            : toFire
              ? 'Steps were missing: it declared nothing but the danger.'
              : 'Steps were missing: it declared nothing.'}
        </p>
      )}
      <PrintRecord walk={walk} />
    </StepFrame>
  );
}

function endedWords(purpose: SheetPurpose, rig: string): string {
  const { declares } = CLOSING[purpose];
  return declares === null ? `It declared nothing about ${rig}.` : `${rig} was declared ${declares}.`;
}
