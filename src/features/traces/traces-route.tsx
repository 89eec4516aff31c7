import { useRef } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { FigureFields, FigureKeypad } from '../../components/figure-fields';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { WordsField } from '../../components/words-field';
import { paths } from '../../config/paths';
import { KeptTraces } from './kept-traces';
import { TRACE_KEYPAD_WORDS } from './keypad-words';
import { TraceView } from './trace-view';
import { useTraceFacts, type TraceFacts } from './use-trace-facts';
import { useTraces, type Traces } from './use-traces';
import './traces.css';

/** Oscilloscope files of one firing. */
export function TracesRoute() {
  const { firing: id = '' } = useParams();
  const facts = useTraceFacts(id);
  if (facts === undefined) {
    return (
      <Screen>
        <div className="traces">
          <SaysBlock lead="This firing is not in the tablet’s Book.">
            The Book may still be filling.
          </SaysBlock>
        </div>
      </Screen>
    );
  }
  return <FiringTraces key={id} facts={facts} />;
}

function FiringTraces({ facts }: { readonly facts: TraceFacts }) {
  const input = useRef<HTMLInputElement>(null);
  const traces = useTraces(facts);
  const { figures, state } = traces;
  const choose = (): void => {
    input.current?.click();
  };
  const opened = state.type === 'open';
  return (
    <Screen
      fields={opened ? <FigureFields label="Figures" form={figures} /> : null}
      thumbs={figures.typing && opened ? null : <Thumbs traces={traces} facts={facts} choose={choose} />}
    >
      <input
        ref={input}
        className="heard-only"
        type="file"
        accept=".csv,.txt,.tsv,.dat,text/csv,text/plain"
        aria-label="Trace file"
        tabIndex={-1}
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          event.target.value = '';
          if (file !== undefined) traces.openFile(file);
        }}
      />
      {figures.typing && opened ? (
        <FigureKeypad form={figures} words={TRACE_KEYPAD_WORDS} />
      ) : (
        <TracesFigure facts={facts} traces={traces} />
      )}
    </Screen>
  );
}

interface ThumbsProps {
  readonly traces: Traces;
  readonly facts: TraceFacts;
  readonly choose: () => void;
}

function Thumbs({ traces, facts, choose }: ThumbsProps) {
  const navigate = useNavigate();
  const { state, kept } = traces;
  const back = (
    <ThumbDome
      key="back"
      label="Back to firing"
      onComplete={() => void navigate(paths.firing(facts.firing.id))}
    />
  );
  const shut = <ThumbDome key="close" label="Close trace" onComplete={traces.close} />;
  if (state.type === 'open' && kept === null) {
    return (
      <ThumbZone
        label="Actions"
        main={
          <ThumbDome
            size="big"
            label={'Hold to\nkeep trace'}
            hold="half-second"
            holdLabel="Hold: keep trace"
            onComplete={traces.keep}
          />
        }
        others={[shut]}
      />
    );
  }
  return (
    <ThumbZone
      label="Actions"
      main={<ThumbDome size="big" label={'Choose\nfile'} onComplete={choose} />}
      others={[state.type === 'open' ? shut : back]}
    />
  );
}

function TracesFigure({ facts, traces }: { readonly facts: TraceFacts; readonly traces: Traces }) {
  const { firing, revision, zone } = facts;
  const { state, draft, change, kept, said } = traces;
  return (
    <div className="traces">
      <h1>Traces of firing {firing.number}</h1>
      {said === null ? null : <p role="status">{said}</p>}
      {state.type === 'reading' ? <p role="status">{state.name} is being read.</p> : null}
      {state.type === 'refused' ? (
        <p className="field-refusal" role="alert">
          {state.words}
        </p>
      ) : null}
      {state.type === 'none' ? (
        <SaysBlock muted>
          Choose the text table (CSV) that an oscilloscope saves: any separator, decimal points or commas. It
          is read on this tablet.
        </SaysBlock>
      ) : null}
      {state.type === 'open' ? (
        <>
          <TraceView
            file={state.file}
            draft={draft}
            change={change}
            spec={revision.spec}
            rig={traces.rig}
            look={traces.look}
          />
          {kept === null ? (
            <WordsField
              label="Note"
              hint="probe, where it was clipped, what to know of it"
              value={draft.note}
              onChange={(note) => change({ note })}
            />
          ) : (
            <SaysBlock lead="Kept.">
              What is changed here changes how it is looked at, not the Book.
            </SaysBlock>
          )}
        </>
      ) : null}
      <KeptTraces firing={firing.id} zone={zone} onOpen={traces.openKept} />
    </div>
  );
}
