import {
  cumulativeLimit,
  dailyUvaLimit,
  NITROGEN_LINE_NM,
  perPulseLimit,
  singlePulseLimit,
  trainLimit,
  visibleOldLimit,
} from '../../src/domain/beam/exposure-limit';
import { energyThroughAperture, opticalDensity } from '../../src/domain/beam/eyewear';
import {
  diffuseViewingDistance,
  hazardDistancePulse,
  hazardDistanceRectangular,
  hazardDistanceRound,
} from '../../src/domain/beam/hazard-distance';
import { apertureDivergence, hazardOutput } from '../../src/domain/beam/output';
import { photonCount, photonEnergy } from '../../src/domain/beam/photon';
import { absorbedFraction, dyeMass, penetrationDepth } from '../../src/domain/dye/solution';
import { molarMass } from '../../src/domain/dye/molar-mass';
import type { ReferenceFunction } from './fn-table';
import type { Inputs } from './inputs';

export const BEAM_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'beam.photonEnergy': (i) => photonEnergy(i.number('lambda_nm')),
  'beam.photonCount': (i) => photonCount(i.number('lambda_nm'), i.number('E_J')),
  'beam.exposureLimit.singlePulse': (i) => singlePulseLimit(wavelengthOf(i), i.number('t_s')),
  'beam.exposureLimit.visibleOldTable': (i) => visibleOldLimit(i.number('lambda_nm'), i.number('t_s')),
  'beam.exposureLimit.cumulative': (i) => cumulativeLimit(wavelengthOf(i), i.number('T_s')),
  'beam.exposureLimit.dailyUVA': (i) => dailyUvaLimit(wavelengthOf(i), i.number('T_s')),
  'beam.exposureLimit.trainFactor': (i) => trainLimit(i.number('N'), i.number('t_s'), wavelengthOf(i)),
  'beam.exposureLimit.perPulse': (i) =>
    perPulseLimit({
      rate_Hz: i.number('f_Hz'),
      pulse_s: i.number('t_s'),
      exposure_s: i.number('T_s'),
      wavelength_nm: wavelengthOf(i),
    }),
  'beam.energyThroughAperture': (i) => energyThroughAperture(i.number('MPE_J_m2'), i.number('aperture_mm')),
  'beam.hazardDistanceCircular': (i) =>
    hazardDistanceRound({
      energy_J: i.number('Q_J'),
      diameter_mm: i.number('a_mm'),
      divergence_mrad: i.number('phi_mrad'),
      limit_J_m2: i.number('MPE_J_m2'),
    }),
  'beam.hazardDistanceRectangular': rectangularOf,
  'beam.diffuseViewingDistance': (i) =>
    diffuseViewingDistance({
      energy_J: i.number('Q_J'),
      limit_J_m2: i.number('MPE_J_m2'),
      reflectance: i.number('reflectance', 1),
    }),
  'beam.opticalDensity': (i) =>
    opticalDensity({
      energy_J: i.number('Q_J'),
      area_m2: i.number('A_m2'),
      limit_J_m2: i.number('MPE_J_m2'),
    }),
  'laser.outputRange.hazard': (i) => hazardOutput(i.number('E0_J')),
  'laser.divergenceAperture': (i) => apertureDivergence(i.number('w_mm'), i.number('L_mm')),
  'dye.molarMass': (i) => molarMass(i.text('formula')),
  'dye.mass': (i) =>
    dyeMass({
      concentration_M: i.number('c_mol_L'),
      volume_L: i.number('V_L'),
      molarMass_g_mol: i.number('M_g_mol'),
    }),
  'dye.penetrationDepth': (i) => penetrationDepth(i.number('eps_L_mol_cm'), i.number('c_mol_L')),
  'dye.absorbedFraction': (i) =>
    absorbedFraction({
      absorption_L_mol_cm: i.number('eps_L_mol_cm'),
      concentration_M: i.number('c_mol_L'),
      length_cm: i.number('l_cm'),
    }),
};

function wavelengthOf(i: Inputs): number {
  return i.number('lambda_nm', NITROGEN_LINE_NM);
}

function rectangularOf(i: Inputs) {
  const beam = {
    energy_J: i.number('Q_J'),
    width_mm: i.number('a_mm'),
    height_mm: i.number('b_mm'),
    divergenceWidth_mrad: i.number('div_a_mrad'),
    divergenceHeight_mrad: i.number('div_b_mrad'),
  };
  return i.has('MPE_J_m2')
    ? hazardDistanceRectangular(beam, i.number('MPE_J_m2'))
    : hazardDistancePulse(beam, i.number('t_s'), wavelengthOf(i));
}
