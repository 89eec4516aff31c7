import { SaysBlock } from '../../components/says-block';
import type { Figure, LookupAnswer } from '../../domain/lookup/lookup';
import { LargeFigure, ListedFigure } from './figure-reading';
import { LookupActions } from './lookup-actions';
import { facesOf, LookupChart } from './lookup-chart';
import { LookupCaution } from './lookup-caution';
import { SweepFigure } from './sweep-figure';
import type { LookupView } from './use-lookup';

/** The answer: figures large, the curve beside them, and what to read before acting on them. */
export function LookupFigure({ view }: { readonly view: LookupView }) {
  const { answer, refusal, computing, form } = view;
  return (
    <div className="lookup-figure">
      {form.view === 'sweep' ? (
        <SweepFigure view={view} />
      ) : refusal !== null ? (
        <div className="lookup-empty">
          <SaysBlock lead="No answer here.">{refusal.words}</SaysBlock>
        </div>
      ) : answer === null ? (
        <div className="lookup-empty">{computing ? <p className="muted">Computing</p> : null}</div>
      ) : (
        <AnswerBody view={view} answer={answer} />
      )}
      <LookupActions view={view} />
    </div>
  );
}

function AnswerBody({ view, answer }: { readonly view: LookupView; readonly answer: LookupAnswer }) {
  const sliced = facesOf(answer) !== null && answer.plot?.point !== undefined;
  const large = sliced ? [] : answer.figures.filter((figure) => figure.weight === 'answer');
  const of = (weight: Figure['weight']) =>
    answer.figures.filter((figure) => figure.weight === weight && !(sliced && figure.face !== undefined));
  const { plot } = answer;
  return (
    <>
      <div className={`lookup-answer ${plot === undefined ? 'alone' : sliced ? 'sliced' : 'beside'}`}>
        {large.length === 0 && answer.says === undefined ? null : (
          <div className="lookup-figures">
            {large.map((figure) => (
              <LargeFigure key={figure.key} figure={figure} />
            ))}
            {answer.says === undefined ? null : <p className="lookup-says">{answer.says}</p>}
          </div>
        )}
        {plot === undefined ? null : (
          <div className="lookup-plot">
            <LookupChart answer={answer} plot={plot} lean={leanOf(view, answer)} />
          </div>
        )}
      </div>
      <div className="lookup-notes">
        <SaysBlock muted>
          {view.computing ? <b>Computing. </b> : null}
          {answer.model}.
        </SaysBlock>
        <LookupCaution view={view} answer={answer} />
      </div>
      <FigureList figures={[...of('main'), ...of('side')]} />
    </>
  );
}

function FigureList({ figures }: { readonly figures: readonly Figure[] }) {
  if (figures.length === 0) return null;
  return (
    <div className="lookup-list">
      {figures.map((figure) => (
        <ListedFigure key={figure.key} figure={figure} />
      ))}
    </div>
  );
}

/** What is sought leans on the face that it was sought for. */
function leanOf({ solvable }: LookupView, answer: LookupAnswer): 'low' | 'high' | null {
  const face = answer.figures.find((figure) => figure.key === solvable?.figure)?.face;
  return face === 'low' || face === 'high' ? face : null;
}
