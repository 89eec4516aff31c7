import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { testSpec } from '../../../tests/support/test-lab';
import type { BodyOf } from '../book/kinds';
import type { RigSpec } from '../book/rig-spec';
import type { RigCalibration } from './rig-calibration';
import { driftWords, wornParts } from './due-wear';

const film: RigSpec['first'] = {
  kind: 'sheet',
  dielectric: 'PET',
  eps_r: 3.2,
  ply_um: 175,
  plies: 2,
  plate_pairs: 1,
  length_mm: 300,
  width_mm: 300,
  strength_kV_mm: 80,
};
const fitted = (shots_before: number): BodyOf<'part.fitted'> => ({
  what: 'Film of the dump capacitor',
  place: 'first',
  where: '',
  serial: '',
  catalogue: null,
  fitted_on: null,
  shots_before,
  replaces: null,
  note: '',
});

function worn(shots_before: number) {
  const bench = new PureBench();
  bench.book.write('part.fitted', bench.rig, fitted(shots_before));
  const rig = bench.book.doc('rig', bench.rig);
  const parts = [...bench.book.documents.values()].filter((doc) => doc.kind === 'part');
  const revisions = rig.revisions.map((one) => ({ ...one, spec: { ...testSpec, first: film } }));
  return wornParts({ ...rig, revisions }, parts, []);
}

describe('worn parts', () => {
  // 22 kV over 0.35 mm are 62.9 kV/mm of 80: by the eighth power such a film stands about 6.9 shots.
  it('come up once a fifth of the expected life is used, and say how much is left', () => {
    expect(worn(1)).toEqual([]);
    const [part] = worn(2);
    expect(part?.name).toBe('Film of the dump capacitor');
    expect(part?.used).toBeGreaterThan(0.2);
    expect(part?.words).toContain('may fail any time now');
  });

  it('ask for a replacement once it is used up', () => {
    expect(worn(8)[0]?.words).toContain('replace the part');
  });
});

describe('drift', () => {
  const calibrated = (drift: object) => ({ fit: { drift } }) as unknown as RigCalibration;

  it('speaks only when it stands out of the scatter', () => {
    expect(driftWords(null)).toBeNull();
    expect(driftWords(calibrated({ type: 'none', words: 'No drift.' }))).toBeNull();
    expect(driftWords(calibrated({ type: 'too-few', words: 'Too few.' }))).toBeNull();
    expect(driftWords(calibrated({ type: 'falling', words: 'Falling.' }))).toBe('Falling.');
  });
});
