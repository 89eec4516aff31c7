import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { createAsked } from './asked.fixture';
import { DYE_LOOKUP as DYE } from './dye-lookup';
import { solveFor } from './solve';

const { asked, figure, refusal, values } = createAsked(DYE, {
  spec: HERON_SPEC,
  settings: DEMO_LAB_SETTINGS,
});

const SOLUTION = { dye: 'coumarin 1 (47, 460)', concentration_mM: 2, volume_mL: 500, purity_percent: 100 };

describe('the dye lookup', () => {
  // Coumarin 1 is 231.29 g/mol (physics I): a mole for 500 L at 2 mmol/L, so half a litre takes 231.3 mg.
  it('weighs 231 mg of coumarin 1 for half a litre of 2 mmol/L', () => {
    expect(figure('mass', SOLUTION).value).toBeCloseTo(231.3, 1);
    expect(figure('mass', { ...SOLUTION, purity_percent: 80 }).value).toBeCloseTo(231.3 / 0.8, 1);
  });

  it('reads a formula with its water, and names what it cannot read', () => {
    const other = { ...SOLUTION, dye: 'other', formula: 'C14H17NO2' };
    expect(figure('mass', other).value).toBeCloseTo(figure('mass', SOLUTION).value, 9);
    expect(refusal({ ...other, formula: '' })).toMatchObject({ field: 'formula' });
    expect(refusal({ ...other, formula: 'C14(H' })).toMatchObject({ field: 'formula' });
  });

  it('thins a stock instead', () => {
    expect(figure('stock_volume', { ...SOLUTION, stock_mM: 20 }).value).toBeCloseTo(50, 9);
    expect(refusal({ ...SOLUTION, stock_mM: 1 })).toMatchObject({ field: 'concentration_mM' });
  });

  // 1/(ln 10 * 1e4 * 5e-3) cm = 87 um, by hand.
  it('gives the depth of the pump only where its absorption was measured', () => {
    const pumped = { ...SOLUTION, concentration_mM: 5, absorption: 10_000, cell_mm: 10 };
    expect(figure('depth', pumped).value).toBeCloseTo(86.86, 2);
    expect(asked(pumped).says).toMatch(/thin the solution/);
    expect(asked({ ...pumped, concentration_mM: 2 }).says).toMatch(/0\.1 to 0\.3 mm/);
    expect(asked(SOLUTION).figures.map(({ key }) => key)).not.toContain('depth');
  });

  it('finds the concentration for a wanted depth', () => {
    const at = values({ ...SOLUTION, absorption: 10_000 });
    const found = solveFor(DYE, at, { solvable: DYE.solvable[0]!, target: 200 });
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.value).toBeCloseTo(1e7 / (Math.LN10 * 10_000 * 200), 2);
  });

  // 2e-3 J/m2 through 7 mm: 77 nJ (physics H).
  it('holds the dye light against what an eye may take', () => {
    expect(figure('eye').value).toBeCloseTo(77, 0);
    expect(figure('eye').rounding).toBe('down');
    expect(figure('light', { pump_uJ: 100, dye_nm: 500 }).value).toBeCloseTo(67.42, 2);
    expect(figure('od').value).toBeGreaterThan(3);
  });

  it('says what to mind of dye and solvent', () => {
    expect(asked({ ...SOLUTION, dye: 'DCM', solvent: 'DMSO' }).cautions.join(' ')).toMatch(
      /mutagenic.*DMSO: Carries dye through the skin/,
    );
    expect(asked({ ...SOLUTION, solvent: 'other' }).cautions.join(' ')).toMatch(/safety sheet/);
  });
});
