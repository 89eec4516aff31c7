import type { BodyOf } from '../../domain/book/kinds';
import type { ReadingDoc } from '../../domain/book/documents/reading';
import type { TraceSurvey } from '../../domain/oscillogram/survey';
import {
  EMPTY_TRACE,
  probeKey,
  TIME_UNITS,
  UNITS,
  type TimeUnit,
  type TraceDraft,
  type UnitKey,
} from './trace-draft';

/** How a kept trace was read, as the screen's own draft, so that it opens as it was kept. */
export function keptDraft(
  { reading_as, reading, note }: Pick<BodyOf<'trace.attached'>, 'reading_as' | 'reading' | 'note'>,
  survey: TraceSurvey,
  readings: readonly ReadingDoc[],
): TraceDraft {
  const no = readings.find((one) => one.id === reading)?.no;
  const texts: Record<string, string> = { reading: no === undefined ? '' : String(no) };
  if (reading_as === null) return { ...EMPTY_TRACE, texts, note };
  if (survey.time.type === 'none')
    texts['interval'] = String(Number((reading_as.time_unit_s * 1e9).toPrecision(12)));
  const choices: Record<string, TraceDraft['choices'][string]> = {};
  for (const channel of reading_as.channels) {
    const { column, shows, inverted, probe_ratio, unit_V_or_A } = channel;
    choices[String(column)] = { shows, inverted, unit: unitKey(unit_V_or_A, shows === 'current') };
    texts[probeKey(column)] = String(probe_ratio);
  }
  return { ...EMPTY_TRACE, choices, texts, note, time_unit: timeUnit(reading_as.time_unit_s) };
}

function unitKey(size: number, current: boolean): UnitKey {
  const keys = Object.keys(UNITS) as UnitKey[];
  const fitting = keys.filter((key) => UNITS[key] === size);
  return fitting.find((key) => key.endsWith('A') === current) ?? fitting[0] ?? 'V';
}

function timeUnit(size_s: number): TimeUnit {
  return (Object.keys(TIME_UNITS) as TimeUnit[]).find((key) => TIME_UNITS[key] === size_s) ?? 's';
}
