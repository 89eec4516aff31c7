import { Link, useNavigate, useParams } from 'react-router-dom';
import { FigureFields, FigureKeypad } from '../../components/figure-fields';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useKit } from '../../data/use-book';
import type { KitDoc } from '../../domain/book/documents/kit';
import { itemWords, KIT_TYPE_WORDS } from '../../domain/report/kit-words';
import { DeedForm } from './deed-form';
import { DueMark } from './due-mark';
import { useHolderWords } from './holder-words';
import { KIT_KEYPAD_WORDS } from './keypad-words';
import { KitHistory } from './kit-history';
import { dueOf } from './kit-register';
import { useKitDeed, type KitDeed } from './use-kit-deed';
import './kit.css';

/** One piece of the register. */
export function KitPieceRoute() {
  const { kit: id = '' } = useParams();
  const kit = useKit().find((one) => one.id === id);
  const navigate = useNavigate();
  const back = (
    <ThumbDome key="back" label="Back to the register" onComplete={() => void navigate(paths.kit())} />
  );
  if (kit === undefined) {
    return (
      <Screen thumbs={<ThumbZone label="Actions" main={back} />}>
        <div className="kit">
          <SaysBlock lead="This piece is not in the register.">
            It was taken out, or this tablet’s Book is still filling.
          </SaysBlock>
        </div>
      </Screen>
    );
  }
  return <Piece key={kit.id} kit={kit} back={back} />;
}

function Piece({ kit, back }: { readonly kit: KitDoc; readonly back: React.ReactNode }) {
  const deed = useKitDeed(kit);
  const { figures, hindrance, retires } = deed;
  return (
    <Screen
      fields={figures.specs.length === 0 ? null : <FigureFields label="Figures" form={figures} />}
      thumbs={
        figures.typing ? null : (
          <ThumbZone
            label="Actions"
            main={
              <ThumbDome
                size="big"
                hold={retires ? 'second' : 'half-second'}
                critical={retires}
                label={retires ? 'Hold to\ntake out' : 'Hold\nto log'}
                holdLabel={`Hold: ${HOLD_WORDS[deed.deed]} ${kit.number}`}
                disabled={hindrance !== null}
                {...(hindrance === null ? {} : { reason: hindrance })}
                onComplete={deed.log}
              />
            }
            others={[back]}
          />
        )
      }
    >
      {figures.typing ? (
        <FigureKeypad form={figures} words={KIT_KEYPAD_WORDS} />
      ) : (
        <PieceFigure kit={kit} deed={deed} />
      )}
    </Screen>
  );
}

const HOLD_WORDS = { issue: 'issue', return: 'return', inspect: 'inspect' } as const;

function PieceFigure({ kit, deed }: { readonly kit: KitDoc; readonly deed: KitDeed }) {
  const { hindrance, now_ms, zone, save } = deed;
  const holderWords = useHolderWords();
  const due = dueOf(kit, now_ms, zone);
  return (
    <div className="kit kit-form">
      <div className="kit-head">
        <h1>
          {kit.number}, {kit.name}
        </h1>
        <p className="muted">{KIT_TYPE_WORDS[kit.item.type].one}</p>
      </div>
      <div className="kit-stands">
        <p>{itemWords(kit.item)}</p>
        {kit.item.type === 'spare' ? null : (
          <>
            <p>{holderWords(kit.holder)}</p>
            <p className="kit-due">
              <DueMark due={due} />
              <b>{due.words}</b>
            </p>
          </>
        )}
        {kit.note === '' ? null : <p className="muted">{kit.note}</p>}
      </div>
      <DeedForm kit={kit} deed={deed} />
      <p role="status" className={hindrance === null ? '' : 'muted'}>
        {hindrance ?? 'Ready to log.'}
        {save === 'not-saved' ? ' The draft could not be kept on this tablet.' : ''}
      </p>
      <p>
        <Link to={paths.notesOf('kit', kit.id)}>Notes and photos</Link>
      </p>
      <KitHistory kit={kit} zone={zone} />
    </div>
  );
}
