import { useMemo } from 'react';
import { Chart } from '../../components/chart/chart';
import type { ChartData, ChartWords, Slice, SliceFace } from '../../components/chart/types';
import { figureLine } from '../../domain/lookup/figure-text';
import type { Figure, LookupAnswer, Plot } from '../../domain/lookup/lookup';

/** The curve beside the answer, with the answer as its slice where the answer is an interval. */
export function LookupChart({ answer, plot, lean }: Props) {
  const data = useMemo(() => chartData(plot), [plot]);
  const words = useMemo(() => wordsOf(answer), [answer]);
  const slice = sliceOf(answer, lean);
  return <Chart title={plot.title} data={data} words={words} {...(slice === null ? {} : { slice })} />;
}

interface Props {
  readonly answer: LookupAnswer;
  readonly plot: Plot;
  /** The face that the purpose of a search leans on, before the answer's own. */
  readonly lean: 'low' | 'high' | null;
}

/** A plot's axes carry a label that the chart does not draw: its unit stands in the top tick's place. */
export function chartData(plot: Plot): ChartData {
  const { title: _, ...data } = plot;
  return data;
}

/** Faces of the answer; null for an answer that is no interval. */
export function facesOf(answer: LookupAnswer): { readonly low: Figure; readonly high: Figure } | null {
  const low = answer.figures.find((figure) => figure.face === 'low' && figure.words === undefined);
  const high = answer.figures.find((figure) => figure.face === 'high' && figure.words === undefined);
  return low === undefined || high === undefined ? null : { low, high };
}

function sliceOf(answer: LookupAnswer, lean: Props['lean']): Slice | null {
  const faces = facesOf(answer);
  if (faces === null || answer.plot?.point === undefined) return null;
  const middle = answer.figures.filter((figure) => figure.face === 'law');
  return {
    low: sliceFace(faces.low),
    high: sliceFace(faces.high),
    middle: middle.map((figure) => ({ label: figure.label, value: figureLine(figure) })),
    lean: lean ?? answer.lean ?? 'high',
  };
}

function sliceFace(figure: Figure): SliceFace {
  return {
    value: figureLine(figure),
    unit: figure.unit,
    words: figure.label,
    ...(figure.note === undefined ? {} : { note: figure.note }),
  };
}

/** Heads of the chart's table: the labels of the faces, so that it says what the slice says. */
function wordsOf(answer: LookupAnswer): ChartWords {
  const faces = facesOf(answer);
  const law = answer.figures.find((figure) => figure.face === 'law');
  return {
    showTable: 'Table',
    showChart: 'Chart',
    low: faces?.low.label ?? 'low',
    high: faces?.high.label ?? 'high',
    law: law?.label ?? 'law',
    own: answer.plot?.own?.label ?? 'own',
    number: 'No.',
  };
}
