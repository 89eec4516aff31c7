import { describe, expect, it } from 'vitest';
import { asked, figure, heronValues, refusal } from './asked.fixture';
import { DYE_LOOKUP as DYE } from './dye-lookup';
import { solveFor } from './solve';

const SOLUTION = { dye: 'coumarin 1 (47, 460)', concentration_mM: 2, volume_mL: 500, purity_percent: 100 };

describe('the dye lookup', () => {
  // Coumarin 1 is 231.29 g/mol (physics I): a mole for 500 L at 2 mmol/L, so half a litre takes 231.3 mg.
  it('weighs 231 mg of coumarin 1 for half a litre of 2 mmol/L', () => {
    expect(figure(DYE, 'mass', SOLUTION).value).toBeCloseTo(231.3, 1);
    expect(figure(DYE, 'mass', { ...SOLUTION, purity_percent: 80 }).value).toBeCloseTo(231.3 / 0.8, 1);
  });

  it('reads a formula with its water, and names what it cannot read', () => {
    const other = { ...SOLUTION, dye: 'other', formula: 'C14H17NO2' };
    expect(figure(DYE, 'mass', other).value).toBeCloseTo(figure(DYE, 'mass', SOLUTION).value, 9);
    expect(refusal(DYE, { ...other, formula: '' })).toMatchObject({ field: 'formula' });
    expect(refusal(DYE, { ...other, formula: 'C14(H' })).toMatchObject({ field: 'formula' });
  });

  it('thins a stock instead', () => {
    expect(figure(DYE, 'stock_volume', { ...SOLUTION, stock_mM: 20 }).value).toBeCloseTo(50, 9);
    expect(refusal(DYE, { ...SOLUTION, stock_mM: 1 })).toMatchObject({ field: 'concentration_mM' });
  });

  // 1/(ln 10 * 1e4 * 5e-3) cm = 87 um, by hand.
  it('gives the depth of the pump only where its absorption was measured', () => {
    const pumped = { ...SOLUTION, concentration_mM: 5, absorption: 10_000, cell_mm: 10 };
    expect(figure(DYE, 'depth', pumped).value).toBeCloseTo(86.86, 2);
    expect(asked(DYE, pumped).says).toMatch(/thin the solution/);
    expect(asked(DYE, { ...pumped, concentration_mM: 2 }).says).toMatch(/0\.1 to 0\.3 mm/);
    expect(asked(DYE, SOLUTION).figures.map(({ key }) => key)).not.toContain('depth');
  });

  it('finds the concentration for a wanted depth', () => {
    const values = heronValues(DYE, { ...SOLUTION, absorption: 10_000 });
    const found = solveFor(DYE, values, { solvable: DYE.solvable[0]!, target: 200 });
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.value).toBeCloseTo(1e7 / (Math.LN10 * 10_000 * 200), 2);
  });

  // 2e-3 J/m2 through 7 mm: 77 nJ (physics H).
  it('holds the dye light against what an eye may take', () => {
    expect(figure(DYE, 'eye').value).toBeCloseTo(77, 0);
    expect(figure(DYE, 'eye').rounding).toBe('down');
    expect(figure(DYE, 'light', { pump_uJ: 100, dye_nm: 500 }).value).toBeCloseTo(67.42, 2);
    expect(figure(DYE, 'od').value).toBeGreaterThan(3);
  });

  it('says what to mind of dye and solvent', () => {
    expect(asked(DYE, { ...SOLUTION, dye: 'DCM', solvent: 'DMSO' }).cautions.join(' ')).toMatch(
      /mutagenic.*DMSO: Carries dye through the skin/,
    );
    expect(asked(DYE, { ...SOLUTION, solvent: 'other' }).cautions.join(' ')).toMatch(/safety sheet/);
  });
});
