import {
  LIMITS_PPM,
  nitrogenOxideLevel,
  ozoneLevel,
  SPARK_MOLECULES_PER_J,
  type Room,
} from '../room/air-quality';
import type { Answer } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { ok, type Refusal, type Result } from '../units/result';
import { energyWords } from './energy-words';
import type { Entered } from './entered';
import { figureOf, spread, warningsOf } from './figures';
import type { Figure, LookupAnswer, Plot, Values } from './lookup';

const CURVE_PIECES = 40;
/** Below it nothing is drawn: a scale of decades has no 0. */
const LEAST_PPM = 1e-9;

interface Source {
  readonly power_W: number;
  readonly yield_g_kWh: number;
  readonly decay_per_h: number;
}

/** Ozone from corona and nitrogen oxides from sparks in the long run, each against its limit. */
export function airAnswer(input: Entered, values: Values): Result<LookupAnswer> {
  const room: Room = { room_m3: input.number('room_m3'), airChanges_h: input.number('air_changes_h') };
  const source: Source = {
    power_W: input.number('corona_W'),
    yield_g_kWh: input.number('yield_g_kWh'),
    decay_per_h: input.number('decay_h'),
  };
  const ozone = ozoneLevel(source, room);
  if (!ozone.ok) return ozone;
  const spark_W = input.number('shot_J') * input.number('rate_Hz');
  const nox = nitrogenOxideLevel({ power_W: spark_W, molecules_per_J: SPARK_MOLECULES_PER_J }, room);
  return ok({
    figures: [
      figureOf(['ozone', 'ozone in the long run'], ozone.value, {
        rounding: 'up',
        weight: 'answer',
        note: `limit ${LIMITS_PPM.ozone}\u2009ppm`,
      }),
      noxFigure(nox),
      {
        key: 'spark_power',
        label: 'power in the sparks at most',
        value: spark_W,
        unit: 'W',
        rounding: 'up',
        digits: 3,
        weight: 'main',
        note: `${energyWords(input.number('shot_J'), values)}, every shot`,
      },
      shareFigure(['ozone_share', 'ozone of its limit'], ozone.value, LIMITS_PPM.ozone),
      ...(nox.ok
        ? [
            shareFigure(
              ['nox_share', 'nitrogen oxides of the NO2 ceiling'],
              nox.value,
              LIMITS_PPM.nitrogenDioxide,
            ),
          ]
        : []),
    ],
    says: saysOf(ozone.value, nox.ok ? nox.value : null),
    model: `${ozone.value.model}; nitrogen oxides 7e16 molecules a joule of spark in air`,
    valid: `long run, well mixed; ozone ${ozone.value.valid}`,
    warnings: warningsOf([ozone.value, ...(nox.ok ? [nox.value] : [])]),
    cautions: [
      'The smell of ozone is no alarm: the nose tires within minutes. Extract at the gap, and measure where people stand.',
      'Both figures are an order of size. Workplace limits and the local rules go before them.',
    ],
    plot: plotOf(source, room, ozone.value),
  });
}

function noxFigure(nox: Result<Answer>): Figure {
  if (nox.ok) {
    return figureOf(['nox', 'nitrogen oxides in the long run'], nox.value, {
      rounding: 'up',
      weight: 'answer',
      note: `ceiling ${LIMITS_PPM.nitrogenDioxide}\u2009ppm for NO2`,
    });
  }
  return {
    key: 'nox',
    label: 'nitrogen oxides in the long run',
    value: 0,
    unit: 'ppm',
    rounding: 'up',
    digits: 3,
    weight: 'answer',
    words: wordsOf(nox.refusal),
  };
}

function wordsOf(refusal: Refusal): string {
  return refusal.type === 'too-small'
    ? 'without air changes they rise for as long as it runs'
    : refusal.words;
}

function shareFigure(named: readonly [key: string, label: string], level: Answer, limit: number): Figure {
  return figureOf(named, level, { rounding: 'up', times: 100 / limit, unit: '%', digits: 2 });
}

function saysOf(ozone: Answer, nox: Answer | null): string {
  const over = [
    ...(ozone.value > LIMITS_PPM.ozone ? ['ozone'] : []),
    ...(nox !== null && nox.value > LIMITS_PPM.nitrogenDioxide ? ['nitrogen oxides'] : []),
  ];
  if (over.length > 0) return `Over the limit: ${over.join(' and ')}. Ventilate, extract or enclose.`;
  return ozone.band.high > LIMITS_PPM.ozone
    ? 'Under the limit, and within its uncertainty of it: ventilate.'
    : 'Under the limits in the long run, with the room well mixed.';
}

function plotOf(source: Source, room: Room, ozone: Answer): Plot {
  const to = Math.max(10, 1.5 * room.airChanges_h);
  const points = spread({ from: 0, to }, CURVE_PIECES).flatMap((x) => {
    const at = ozoneLevel(source, { ...room, airChanges_h: x });
    return at.ok ? [{ x, y: at.value.value, low: at.value.band.low, high: at.value.band.high }] : [];
  });
  const heights = [...points.flatMap(({ low, high }) => [low, high]), LIMITS_PPM.ozone].filter(
    (y) => y > LEAST_PPM,
  );
  const ppm = formatFigure(ozone.value, { digits: { significant: 2 }, rounding: 'up' });
  return {
    title: `Ozone against air changes: ${ppm} ppm at ${room.airChanges_h.toFixed(1)} an hour`,
    x: { label: 'Air changes', unit: '1/h', min: 0, max: to, decimals: 1 },
    y: {
      label: 'Ozone',
      unit: 'ppm',
      min: Math.min(...heights) / 2,
      max: Math.max(...heights) * 2,
      kind: 'log',
    },
    ...(ozone.band.low <= LEAST_PPM
      ? {}
      : {
          band: {
            points: points.map(({ x, low, high }) => ({ x, low, high })),
            above: 'more',
            below: 'less',
          },
          law: points.map(({ x, y }) => ({ x, y })),
          point: { x: room.airChanges_h, low: ozone.band.low, high: ozone.band.high, y: ozone.value },
        }),
    limit: { y: LIMITS_PPM.ozone, label: `limit ${LIMITS_PPM.ozone}\u2009ppm` },
  };
}
