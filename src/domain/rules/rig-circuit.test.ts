import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../../seeds/rigs/kettle';
import type { RigSpec } from '../book/rig-spec';
import { circuitOf, rigTransient, type RigCircuit } from './rig-circuit';

const AT = { charge_kV: 12.2, pressure_bar_abs: 1.366, ambient_bar_abs: 0.966, temperature_C: 21 };

function rig(spec: RigSpec): RigCircuit {
  const result = circuitOf(spec, AT);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

const withModel = (model: Partial<RigSpec['model']>): RigSpec => ({
  ...KETTLE_SPEC,
  model: { ...KETTLE_SPEC.model, ...model },
});
const withCharging = (charging: Partial<RigSpec['charging']>, across_kohm: number | null): RigSpec => ({
  ...HERON_SPEC,
  channel: { ...HERON_SPEC.channel, across_kohm },
  charging: { ...HERON_SPEC.charging, ...charging },
});

describe('circuitOf', () => {
  it('takes what the rig says and fills the rest with what is usual, by name', () => {
    const { circuit, assumed } = rig(KETTLE_SPEC);
    expect(circuit).toMatchObject({
      topology: 'charge-transfer',
      dump_F: 5e-9,
      bleed_ohm: 50_000,
      gap: { law: 'rompe-weizel', constant_cm2_atm_V2s: 1, gap_cm: 0.3 },
      feed: null,
    });
    expect(assumed).toEqual(['gap and channel inductance', 'gap law', 'channel law and its breakdown']);
  });

  it('assumes nothing where everything was measured', () => {
    const { circuit, assumed } = rig(
      withModel({
        known: 'measured',
        gap_law: {
          law: 'exponential',
          end_ohm: 0.2,
          start_ohm: 500,
          fall_ns: 1.5,
          constant_cm2_atm_V2s: null,
          known: 'measured',
        },
        channel_law: { over_static: 2, end_ohm: 0.3, start_ohm: 800, fall_ns: 1, known: 'measured' },
      }),
    );
    expect(assumed).toEqual([]);
    expect(circuit.gap).toMatchObject({ law: 'exponential', end_ohm: 0.2, start_ohm: 500 });
    expect(circuit.gap.law === 'exponential' && 1e9 * circuit.gap.fall_s).toBeCloseTo(1.5, 9);
    // Twice the uniform law for nitrogen over 4 mm at 0.966 bar and 21 degrees: 13.1 kV.
    expect((circuit.channel.break_V ?? 0) / 26_200).toBeCloseTo(1, 2);
  });

  it('says so where a law lacks its figure, or a constant is that of another gas', () => {
    const law = {
      law: 'rompe-weizel' as const,
      end_ohm: 0.1,
      start_ohm: 1000,
      fall_ns: null,
      constant_cm2_atm_V2s: null,
      known: 'measured' as const,
    };
    expect(rig(withModel({ known: 'measured', gap_law: law })).assumed).toContain('gap law');
    const sulphur = withModel({ gap_law: { ...law, constant_cm2_atm_V2s: 0.8 } });
    const spec: RigSpec = { ...sulphur, gap: { ...sulphur.gap, gas: 'SF6' } };
    expect(rig(spec).assumed.join()).toContain('air and nitrogen');
  });

  // mu0 h l/w and l sqrt(eps_r)/c by hand: 4 plies of 175 um, 320 mm along and 300 mm across, permittivity 3.2.
  it('makes a feed of a sheet that is switched, with the current along its longer side', () => {
    const { feed, assumed } = rig(HERON_SPEC);
    expect((feed?.sheet_H ?? 0) * 1e9).toBeCloseTo((4e-7 * Math.PI * 0.7e-3 * 320) / 300 / 1e-9, 9);
    expect((feed?.transit_s ?? 0) * 1e9).toBeCloseTo((0.32 * Math.sqrt(3.2)) / 0.299792458, 9);
    expect(assumed).toContain('current along the longer side of the sheet');
    const pairs: RigSpec = {
      ...HERON_SPEC,
      first: { ...HERON_SPEC.first, plate_pairs: 2 } as RigSpec['first'],
    };
    expect((rig(pairs).feed?.sheet_H ?? 0) / (feed?.sheet_H ?? 1)).toBeCloseTo(0.5, 12);
  });

  it('refuses the wave shape of a sheet that has more inductance than its gap', () => {
    const bare: RigSpec = { ...HERON_SPEC, model: { ...HERON_SPEC.model, gap_nH: 0.5 } };
    expect(rigTransient(bare, AT)).toMatchObject({ refusal: { type: 'travelling-waves' } });
  });

  it('takes the charging element that carries more while the swing lasts', () => {
    expect(rig(withCharging({}, 5)).parts).toMatchObject({ charging_uH: 0.1, charging_ohm: 5000 });
    expect(rig(withCharging({ inductor_uH: 5, inductor_ohm: 3 }, null)).parts).toMatchObject({
      charging_uH: 5,
      charging_ohm: 3,
    });
    // 5 uH are some hundred ohms at this pace, and 10 mH some hundred kiloohms.
    expect(rig(withCharging({ inductor_uH: 5 }, 5)).parts.charging_uH).toBe(5);
    expect(rig(withCharging({ inductor_uH: 10_000 }, 5)).parts.charging_ohm).toBe(5000);
    expect(rig(withCharging({ inductor_uH: 5 }, 5)).assumed).toContain('resistance of the charging inductor');
  });

  it('refuses an LC inversion with nothing across its channel, and a channel gas without a law', () => {
    expect(circuitOf(withCharging({}, null), AT)).toMatchObject({
      refusal: { field: 'channel.across_kohm' },
    });
    const oxygen: RigSpec = { ...KETTLE_SPEC, channel: { ...KETTLE_SPEC.channel, gas: 'O2' } };
    expect(circuitOf(oxygen, AT)).toMatchObject({ refusal: { field: 'channel' } });
  });

  it('bleeds the peaking capacitor by its own bleed where nothing lies across the channel', () => {
    const spec: RigSpec = { ...KETTLE_SPEC, channel: { ...KETTLE_SPEC.channel, across_kohm: null } };
    expect(rig(spec).circuit).toMatchObject({ bleed_ohm: 50_000 });
  });
});

describe('rigTransient', () => {
  it('judges a channel in air more harshly than one in nitrogen', () => {
    const air: RigSpec = { ...KETTLE_SPEC, channel: { ...KETTLE_SPEC.channel, gas: 'air' } };
    const at = { ...AT, charge_kV: 18.8, pressure_bar_abs: 1.966 };
    const [nitrogen, other] = [KETTLE_SPEC, air].map((spec) => {
      const solved = rigTransient(spec, at);
      return solved.ok ? (solved.value.gain?.score ?? 0) : Number.NaN;
    });
    expect(other).toBeLessThan(nitrogen!);
  });

  it('gives no gain window for a channel that stays dark', () => {
    const wide: RigSpec = {
      ...KETTLE_SPEC,
      channel: { ...KETTLE_SPEC.channel, spacing_a_mm: 15, spacing_b_mm: 15 },
    };
    expect(rigTransient(wide, { ...AT, charge_kV: 18.8 })).toMatchObject({
      value: { gain: null, currentRise_s: null, answer: { fires: { asGiven: false } } },
    });
  });

  it('stops when asked', () => {
    expect(rigTransient(KETTLE_SPEC, AT, { shouldStop: () => true })).toMatchObject({
      refusal: { type: 'stopped' },
    });
  });
});
