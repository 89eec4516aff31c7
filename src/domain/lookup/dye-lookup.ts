import { singlePulseLimit } from '../beam/exposure-limit';
import { APERTURE_MM } from '../beam/averaging-area';
import { energyThroughAperture, eyewearFor } from '../beam/eyewear';
import { dyeHazardOutput } from '../beam/output';
import { DYES, SOLVENT_CAUTIONS } from '../dye/dyes';
import { molarMass } from '../dye/molar-mass';
import { absorbedFraction, dyeMass, penetrationDepth, stockVolume } from '../dye/solution';
import { BEAM, rigBeam } from '../rules/rig-beam';
import { storedAt_J } from '../rules/rig-figures';
import type { Answer } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { andThen, mapResult, ok, type Result } from '../units/result';
import { densityFigure } from './beam-lookup-figures';
import { DYE_FIELDS, OTHER } from './dye-lookup-fields';
import { beside, entered, type Entered } from './entered';
import { allOf, figureOf, spread, warningsOf } from './figures';
import type { Figure, Known, Lookup, LookupAnswer, Plot, Start, StartFrom } from './lookup';

/** A dye cell: what to weigh, how deep the pump goes, what light comes out (physics I, O). */
export const DYE_LOOKUP: Lookup = {
  key: 'dye',
  title: 'Dye cell',
  decides: 'What to weigh or thin, how deep the pump goes, and what the visible beam asks for.',
  fields: DYE_FIELDS,
  first: 'concentration_mM',
  start,
  answer: (values) =>
    andThen(entered(DYE_FIELDS, values), (input) => beside(answer(input), DYE_FIELDS, FIELD_NAMES)),
  solvable: [
    { field: 'concentration_mM', figure: 'depth', rounding: 'nearest' },
    { field: 'concentration_mM', figure: 'mass', rounding: 'nearest' },
    { field: 'volume_mL', figure: 'mass', rounding: 'down' },
    { field: 'cell_mm', figure: 'absorbed', purpose: 'absorb at least', rounding: 'up' },
  ],
};

const FIELD_NAMES: Readonly<Record<string, string>> = {
  concentration_M: 'concentration_mM',
  volume_L: 'volume_mL',
  stock_M: 'stock_mM',
  absorption_L_mol_cm: 'absorption',
  length_cm: 'cell_mm',
  wavelength_nm: 'dye_nm',
  pulse_s: 'pulse_ns',
  energy_J: 'pump_uJ',
  molarMass_g_mol: 'formula',
};

function start({ spec }: StartFrom): Start {
  const stored = spec === null ? null : storedAt_J(spec, spec.charging.supply_kV);
  const beam = spec === null ? null : rigBeam(spec, stored?.ok === true ? stored.value : 0);
  const known: Known = beam?.ok === true ? 'rig' : 'assumed';
  const pulsed = spec?.beam.pulse_ns;
  return {
    values: {
      dye: 'coumarin 1 (47, 460)',
      formula: '',
      concentration_mM: 5,
      volume_mL: 100,
      purity_percent: 100,
      solvent: 'ethanol',
      stock_mM: null,
      absorption: null,
      cell_mm: 10,
      pump_uJ: beam?.ok === true ? beam.value.planned_uJ : 100,
      pump_nm: spec?.beam.wavelength_nm ?? 337.1,
      pulse_ns: pulsed ?? BEAM.pulse_ns,
      dye_nm: 460,
    },
    known: {
      ...Object.fromEntries(DYE_FIELDS.map(({ key }) => [key, 'assumed' as const])),
      pump_uJ: known,
      pump_nm: known,
      pulse_ns: pulsed === undefined ? 'assumed' : 'rig',
    },
  };
}

/** Per litre and per mole, as the physics takes it. */
interface Solution {
  readonly concentration_M: number;
  readonly volume_L: number;
}

function answer(input: Entered): Result<LookupAnswer> {
  const solution: Solution = {
    concentration_M: input.number('concentration_mM') / 1000,
    volume_L: input.number('volume_mL') / 1000,
  };
  const name = input.choice('dye');
  const dye = DYES.find((each) => each.name === name);
  const molar = molarMass(dye?.formula ?? input.text('formula'));
  if (!molar.ok) return molar;
  const parts = allOf({
    mass: dyeMass({ ...solution, molarMass_g_mol: molar.value.value }),
    stock: stockFigures(input, solution),
    pumped: pumpedFigures(input, solution),
    light: lightFigures(input),
  });
  if (!parts.ok) return parts;
  const { mass, stock, pumped, light } = parts.value;
  const purity = 100 / input.number('purity_percent');
  return ok({
    figures: [
      figureOf(['mass', 'dye to weigh'], mass, {
        rounding: 'nearest',
        times: 1000 * purity,
        unit: 'mg',
        weight: 'answer',
        note: 'fill up to the volume, do not add it',
      }),
      ...stock,
      ...pumped.figures,
      ...light.figures,
      figureOf(['molar_mass', 'molar mass'], molar.value, {
        rounding: 'nearest',
        digits: 5,
        weight: 'side',
        note: dye?.formula ?? input.text('formula').trim(),
      }),
    ],
    ...(pumped.says === undefined ? {} : { says: pumped.says }),
    model: [mass.model, ...pumped.models, light.bound.model].join('; '),
    valid: `${mass.valid}; dye light: ${light.bound.valid}`,
    warnings: warningsOf([light.bound]),
    cautions: cautionsFor(dye?.caution, input.choice('solvent')),
    ...(pumped.plot === undefined ? {} : { plot: pumped.plot }),
  });
}

function cautionsFor(dye: string | undefined, solvent: string): readonly string[] {
  const words = SOLVENT_CAUTIONS.find((each) => each.solvent === solvent)?.words;
  return [
    `${dye ?? 'Treat as toxic: gloves, no dust, no skin contact.'} Weigh it in a hood or wet, and label the flask.`,
    ...(words === undefined ? [] : [`${capital(solvent)}: ${words}`]),
    ...(solvent === OTHER
      ? ['Solvent: read its safety sheet for fire beside sparks, for skin and for breath.']
      : []),
    'The visible beam takes its own eyewear: UV glasses do not stop it. The laser safety officer decides.',
  ];
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function stockFigures(input: Entered, solution: Solution): Result<readonly Figure[]> {
  const stock_mM = input.maybe('stock_mM');
  if (stock_mM === null) return ok([]);
  return mapResult(stockVolume({ ...solution, stock_M: stock_mM / 1000 }), (stock) => [
    figureOf(['stock_volume', 'stock to take instead'], stock, {
      rounding: 'nearest',
      times: 1000,
      unit: 'mL',
      weight: 'answer',
      note: 'then fill up to the volume with solvent',
    }),
  ]);
}

interface Pumped {
  readonly figures: readonly Figure[];
  readonly models: readonly string[];
  readonly says?: string;
  readonly plot?: Plot;
}

/** Side-pumped cells lase well with the pump spent within this, um; from memory. */
const DEPTH_UM = { from: 100, to: 300 };

/** Nothing where nobody measured the absorption: the table's maximum would be a guess. */
function pumpedFigures(input: Entered, { concentration_M }: Solution): Result<Pumped> {
  const absorption_L_mol_cm = input.maybe('absorption');
  if (absorption_L_mol_cm === null) return ok({ figures: [], models: [] });
  const length_cm = input.number('cell_mm') / 10;
  const parts = allOf({
    depth: penetrationDepth(absorption_L_mol_cm, concentration_M),
    absorbed: absorbedFraction({ absorption_L_mol_cm, concentration_M, length_cm }),
  });
  if (!parts.ok) return parts;
  const { depth, absorbed } = parts.value;
  return ok({
    figures: [
      figureOf(['depth', 'pump light falls to 37 % within'], depth, { rounding: 'nearest' }),
      figureOf(['absorbed', 'absorbed in the cell'], absorbed, {
        rounding: 'down',
        times: 100,
        unit: '%',
      }),
    ],
    models: [depth.model],
    says: depthWords(depth.value),
    plot: depthPlot(depth, length_cm),
  });
}

function depthWords(depth_um: number): string {
  if (depth_um < DEPTH_UM.from) {
    return 'The pump is spent in a film under 0.1 mm: thin the solution, or the beam will be a narrow, wide-angled one.';
  }
  return depth_um > DEPTH_UM.to
    ? 'The pump goes deeper than 0.3 mm: the gain is spread thin for pumping from the side.'
    : 'Deep enough and shallow enough for pumping from the side: 0.1 to 0.3 mm.';
}

/** The visible beam as an upper bound, and what it asks of eyewear. */
function lightFigures(
  input: Entered,
): Result<{ readonly figures: readonly Figure[]; readonly bound: Answer }> {
  const [dye_nm, pulse_s] = [input.number('dye_nm'), input.number('pulse_ns') * 1e-9];
  const bound = dyeHazardOutput({
    pump_uJ: input.number('pump_uJ'),
    pump_nm: input.number('pump_nm'),
    dye_nm,
  });
  if (!bound.ok) return bound;
  const limit = singlePulseLimit(dye_nm, pulse_s);
  if (!limit.ok) return limit;
  const energy_J = bound.value.value * 1e-6;
  return mapResult(
    allOf({
      eyewear: eyewearFor([
        { name: 'Dye', wavelength_nm: dye_nm, energy_J, pulse_s, width_mm: 1, height_mm: 1 },
      ]),
      eye: energyThroughAperture(limit.value.value, dye_nm < 400 ? APERTURE_MM.uv : APERTURE_MM.visible),
    }),
    ({ eyewear, eye }) => ({
      bound: bound.value,
      figures: [
        figureOf(['light', 'dye light at most'], bound.value, { rounding: 'up' }),
        densityFigure(['od', `eyewear density at ${dye_nm.toFixed(0)}\u2009nm, one pulse`], eyewear, {
          weight: 'main',
          note: 'beside that for the pump',
        }),
        figureOf(['eye', 'an eye may take at most, a pulse'], eye, { rounding: 'down' }),
      ],
    }),
  );
}

const CURVE_PIECES = 40;

function depthPlot(depth: Answer, length_cm: number): Plot {
  const cell_um = length_cm * 1e4;
  const to = Math.min(cell_um, 5 * depth.value);
  const left = (x: number, depth_um: number) => 100 * Math.exp(-x / depth_um);
  const points = spread({ from: 0, to }, CURVE_PIECES).map((x) => ({
    x,
    y: left(x, depth.value),
    low: left(x, depth.band.low),
    high: left(x, depth.band.high),
  }));
  const at = Math.min(depth.value, to);
  return {
    title: `Pump light in the cell: 37 per cent left after ${formatFigure(depth.value, { digits: { significant: 3 }, rounding: 'nearest' })} micrometres`,
    x: { label: 'Depth', unit: '\u00b5m', min: 0, max: to, decimals: 0 },
    y: { label: 'Pump light left', unit: '%', min: 0, max: 100, decimals: 0 },
    band: {
      points: points.map(({ x, low, high }) => ({ x, low, high })),
      above: 'absorbs less',
      below: 'absorbs more',
    },
    law: points.map(({ x, y }) => ({ x, y })),
    point: {
      x: at,
      low: left(at, depth.band.low),
      high: left(at, depth.band.high),
      y: left(at, depth.value),
    },
    ...(to > DEPTH_UM.from ? { window: { min: DEPTH_UM.from, max: Math.min(to, DEPTH_UM.to) } } : {}),
  };
}
