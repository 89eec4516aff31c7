import { gasHeating, preionisationMinimum, transitTime } from '../../src/domain/channel/discharge';
import { reducedField, reducedFieldFromTorr, townsendUnit } from '../../src/domain/channel/reduced-field';
import {
  upperStateLifetime,
  upperStateLifetimeAir,
  upperStateLifetimeKinetic,
  upperStateLifetimeWithOxygen,
} from '../../src/domain/channel/upper-state';
import type { ReferenceFunction } from './fn-table';

const REFERENCE_C = 20;

export const CHANNEL_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'channel.townsendUnit': (i) => townsendUnit(i.number('T_K')),
  'channel.reducedField': (i) =>
    reducedField({
      voltage_V: i.number('V_V'),
      gap_cm: i.number('d_cm'),
      pressure_bar_abs: i.number('p_bar'),
      temperature_K: i.number('T_K'),
    }),
  'channel.reducedFieldFromTorr': (i) =>
    reducedFieldFromTorr(i.number('E_over_p_V_cm_Torr'), i.number('T_C', REFERENCE_C)),
  'channel.upperStateLifetime': (i) => upperStateLifetime(i.number('p_bar_N2')),
  'channel.upperStateLifetimeKinetic': (i) =>
    upperStateLifetimeKinetic(i.number('p_bar'), i.number('T_C', REFERENCE_C)),
  'channel.upperStateLifetimeAir': (i) =>
    upperStateLifetimeAir(i.number('p_bar'), i.number('T_C', REFERENCE_C)),
  'channel.upperStateLifetimeO2': (i) =>
    upperStateLifetimeWithOxygen({
      pressure_bar_abs: i.number('p_bar'),
      oxygen_share: i.number('x_O2'),
      temperature_C: i.number('T_C', REFERENCE_C),
    }),
  'channel.transitTime': (i) => transitTime(i.number('L_m'), i.number('n', 1)),
  'channel.gasHeating': (i) =>
    gasHeating({
      energy_J: i.number('E_J'),
      volume_cm3: i.number('V_cm3'),
      pressure_bar_abs: i.number('p_bar'),
      temperature_C: i.number('T_C', REFERENCE_C),
    }),
  'channel.preionisationMin': (i) => preionisationMinimum(i.number('D_cm2_s'), i.number('t_s')),
};
