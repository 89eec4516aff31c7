import { plyThickness_m, sheetCapacitance } from '../capacitor/capacitance';
import { minimumStrength, reboundVoltage, relativePermittivity } from '../capacitor/dielectrics';
import { edgeDischargeInception, edgeMargin, slidingDischargeInception } from '../capacitor/edge';
import { sheetWithAirFilm } from '../capacitor/fringe';
import { punctureProbability } from '../capacitor/puncture';
import { airFilmField, dielectricStress, stressMargin } from '../capacitor/stress';
import { answer, type Answer, type Warning } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { ok, refused, type Result } from '../units/result';
import type { Entered } from './entered';
import { allOf, figureOf, warningsOf } from './figures';
import type { Figure } from './lookup';
import type { CapacitorBody } from './capacitor-lookup-body';

/** Test electrodes are about this large; Weibull's exponent of films is 8 to 15 (physics N, from memory). */
const TESTED_CM2 = 10;
const BETA = 10;
/** Air breaks from about here at 1 bar, whatever the film stands. */
const AIR_BREAKS_KV_MM = 3;

/** A sheet capacitor: what it holds, how hard its film and its edges work, and how likely it is to puncture. */
export function sheetBody(input: Entered): Result<CapacitorBody> {
  const film = filmOf(input);
  if (!film.ok) return film;
  const { eps_r, strength, thickness_m } = film.value;
  const voltage_kV = input.number('voltage_kV');
  const thickness_um = thickness_m * 1e6;
  const air_um = input.number('air_um');
  const area_m2 = input.number('length_mm') * input.number('width_mm') * 1e-6;
  const layers = input.number('plate_pairs');
  const parts = allOf({
    capacitance:
      air_um > 0
        ? sheetWithAirFilm({ eps_r, area_m2, thickness_m, air_m: air_um * 1e-6, layers })
        : sheetCapacitance({ eps_r, area_m2, thickness_m, layers }),
    stress: dielectricStress(voltage_kV * 1000, thickness_m),
    margin: stressMargin(voltage_kV * 1000, thickness_m, strength.value),
  });
  if (!parts.ok) return parts;
  const { capacitance, stress, margin } = parts.value;
  const rest = filmFigures({ input, stress, strength, thickness_um, eps_r });
  return ok({
    capacitance,
    stored: capacitance,
    figures: [
      figureOf(['stress', 'stress of the film'], stress, { rounding: 'up', weight: 'answer' }),
      figureOf(['margin', 'margin to its strength'], margin, { rounding: 'down', digits: 2 }),
      figureOf(['strength', 'strength of the film, minimum'], strength, { rounding: 'down', weight: 'side' }),
      ...rest.figures,
    ],
    warnings: [...warningsOf([margin, strength]), ...rest.warnings],
    cautions: rest.cautions,
    plot: {
      y: 'stress',
      perKilovolt: stress.value / voltage_kV,
      limit: {
        y: strength.value / 3,
        label: `a third of ${formatFigure(strength.value, { digits: { significant: 3 }, rounding: 'down' })}\u2009kV/mm`,
      },
      edgesFrom_kV: rest.inception_kV,
    },
  });
}

interface Film {
  readonly eps_r: number;
  readonly strength: Answer;
  readonly thickness_m: number;
}

function filmOf(input: Entered): Result<Film> {
  const thickness = plyThickness_m(input.number('plies'), input.number('ply_um'));
  if (!thickness.ok) return thickness;
  if (input.choice('film') === 'entered') {
    const strength = answer({
      value: input.number('strength_kV_mm'),
      unit: 'kV/mm',
      relative: 0,
      model: 'As entered',
      valid: 'at this thickness',
    });
    return ok({ eps_r: input.number('eps_r'), strength, thickness_m: thickness.value });
  }
  const material = input.choice('dielectric');
  if (material === 'other') {
    return refused({
      type: 'material-unknown',
      field: 'film',
      words: 'Film data: the table does not hold this dielectric. Enter its figures.',
    });
  }
  const table = allOf({
    eps_r: relativePermittivity(material),
    strength: minimumStrength(material, thickness.value * 1000),
  });
  if (!table.ok) return table;
  const { eps_r, strength } = table.value;
  return ok({ eps_r: eps_r.value, strength, thickness_m: thickness.value });
}

interface FilmParts {
  readonly input: Entered;
  readonly stress: Answer;
  readonly strength: Answer;
  readonly thickness_um: number;
  readonly eps_r: number;
}

/** What of edges, air and puncture can be told for this film; a figure that has no founding here is left out. */
function filmFigures({ input, stress, strength, thickness_um, eps_r }: FilmParts) {
  const voltage_kV = input.number('voltage_kV');
  const figures: Figure[] = [];
  const cautions: string[] = [];
  const warnings: Warning[] = [];

  const inception = edgeDischargeInception(thickness_um, eps_r);
  if (inception.ok) {
    figures.push(
      figureOf(['inception', 'edges in air discharge from'], inception.value, {
        rounding: 'down',
        times: 1e-3,
        unit: 'kV peak',
        digits: 2,
      }),
    );
    if (voltage_kV * 1000 > inception.value.band.low) {
      cautions.push(
        'Bare foil edges discharge at this voltage and eat the film: bury them in oil or resin, and look at them.',
      );
    }
  }
  const sliding = slidingDischargeInception(thickness_um, eps_r);
  if (sliding.ok) {
    figures.push(
      figureOf(['sliding', 'discharges slide along it from'], sliding.value, {
        rounding: 'down',
        digits: 2,
        weight: 'side',
      }),
    );
  }
  const wanted = edgeMargin(voltage_kV);
  if (wanted.ok) {
    const there = input.maybe('edge_mm');
    figures.push(
      figureOf(['edge', 'free film wanted at the edge'], wanted.value, { rounding: 'up', digits: 2 }),
    );
    if (there !== null && there < wanted.value.value) {
      warnings.push({
        type: 'edge-too-short',
        words: `The free film is short of what ${formatFigure(voltage_kV, { digits: { significant: 3 }, rounding: 'up' })}\u2009kV want in air: it tracks over the edge.`,
      });
    }
  }
  const air_um = input.number('air_um');
  const air = airFilmField({ voltage_V: voltage_kV * 1000, thickness_um, eps_r, air_um });
  if (air_um > 0 && air.ok) {
    figures.push(figureOf(['air_field', 'field in the air film'], air.value, { rounding: 'up' }));
    if (air.value.value > AIR_BREAKS_KV_MM) {
      warnings.push({ type: 'air-film-breaks', words: 'The air film discharges in every half cycle.' });
    }
  }
  const area_cm2 = input.number('length_mm') * input.number('width_mm') * 0.01 * input.number('plate_pairs');
  const puncture = punctureProbability({
    stress_over_E63: Math.min(10, stress.value / strength.value),
    area_ratio: area_cm2 / TESTED_CM2,
    beta: BETA,
  });
  if (puncture.ok) {
    figures.push(
      figureOf(['puncture', 'chance of a puncture, each time it is charged'], puncture.value, {
        rounding: 'up',
        digits: 1,
      }),
    );
  }
  const rebound = reboundVoltage(input.choice('dielectric'), voltage_kV * 1000);
  if (rebound.ok) {
    figures.push(
      figureOf(['rebound', 'may come back after a short'], rebound.value, { rounding: 'up', digits: 2 }),
    );
    warnings.push(...rebound.value.warnings);
  }
  return { figures, cautions, warnings, inception_kV: inception.ok ? inception.value.value / 1000 : null };
}
