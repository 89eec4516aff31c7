import { createMemory } from '../numerics/memory';
import { ok, refused, type Result } from '../units/result';
import type { CheckedElectrodes } from './electrodes';
import {
  cylinderProfile,
  profileFrom,
  sphereProfiles,
  type AxialProfile,
  type SphereProfiles,
} from './field-geometry';
import { solveHexField } from './hex-field';
import type { HexShape } from './hex-outline';
import { tracePaths } from './hex-path';
import { solveRodField } from './rod-field';

/** Field along a way from one electrode to the other; undefined where it is uniform. */
export type GapField = AxialProfile | undefined;

/** Under this gap over radius the round ends alone decide, and rods are spheres to four digits. */
const SPHERES_BELOW = 0.05;

// A field depends on ratios of lengths alone, and a curve, a solve and a slider ask for the same few again and again.
const rememberSpheres = createMemory<SphereProfiles>(128);
const rememberRods = createMemory<AxialProfile | undefined>(128);
const rememberBars = createMemory<readonly AxialProfile[] | undefined>(128);

/** Fields along every way that may break first at a gap: the weakest counts. */
export function fieldsAt(electrodes: CheckedElectrodes, gap_mm: number): Result<readonly GapField[]> {
  switch (electrodes.shape) {
    case 'plane':
      return ok([undefined]);
    case 'cylinder':
      return ok([cylinderProfile(gap_mm / electrodes.radius_mm)]);
    case 'domed':
    case 'sphere':
      return ok([spheresAt(gap_mm / electrodes.radius_mm).symmetric]);
    case 'capped-rods': {
      const { radius_mm, rod_length_mm } = electrodes;
      const rods = rodProfile(gap_mm / radius_mm, rod_length_mm / radius_mm);
      return rods === undefined ? NO_FIELD : ok([rods]);
    }
    case 'hex-bars': {
      const orientation = electrodes.facing === 'flats' ? 'flat' : 'edge';
      const paths = hexPaths(hexShapeOf(electrodes, { orientation, gap_mm }));
      return paths === undefined ? NO_FIELD : ok(paths);
    }
  }
}

/**
 * The same for the low side, with what may be worse than the shape itself: one of two spheres or rods earthed (for rods
 * two spheres stand in, which crowd the field more), and hexagonal bars edge to edge whatever faces what (physics K2).
 */
export function leastFieldsAt(electrodes: CheckedElectrodes, gap_mm: number): Result<readonly GapField[]> {
  switch (electrodes.shape) {
    case 'domed':
    case 'sphere': {
      const { symmetric, oneEarthed } = spheresAt(gap_mm / electrodes.radius_mm);
      return ok([symmetric, oneEarthed]);
    }
    case 'capped-rods': {
      const rods = fieldsAt(electrodes, gap_mm);
      return rods.ok ? ok([...rods.value, spheresAt(gap_mm / electrodes.radius_mm).oneEarthed]) : rods;
    }
    case 'hex-bars':
      return fieldsAt({ ...electrodes, facing: 'edges' }, gap_mm);
    default:
      return fieldsAt(electrodes, gap_mm);
  }
}

/** Axial profile of round-ended rods by gap and straight part over their radius; undefined if it cannot be solved. */
export function rodProfile(gapOverRadius: number, shaftOverRadius: number): AxialProfile | undefined {
  if (gapOverRadius < SPHERES_BELOW) return spheresAt(gapOverRadius).symmetric;
  return rememberRods(`${String(gapOverRadius)} ${String(shaftOverRadius)}`, () => {
    const field = solveRodField(gapOverRadius, shaftOverRadius + 2);
    return field === undefined ? undefined : profileFrom(field.fieldFactor, field.fieldAt);
  });
}

/** Fields along the lines of force of hexagonal bars that may break first; undefined if they cannot be solved. */
export function hexPaths(shape: HexShape): readonly AxialProfile[] | undefined {
  const key = `${shape.orientation} ${String(shape.cornerOverFlats)} ${String(shape.gapOverFlats)}`;
  return rememberBars(key, () => {
    const field = solveHexField(shape);
    return field === undefined ? undefined : tracePaths(field, shape);
  });
}

function spheresAt(gapOverRadius: number): SphereProfiles {
  return rememberSpheres(String(gapOverRadius), () => sphereProfiles(gapOverRadius));
}

function hexShapeOf(
  { flats_mm, corner_mm }: { readonly flats_mm: number; readonly corner_mm: number },
  { orientation, gap_mm }: { readonly orientation: HexShape['orientation']; readonly gap_mm: number },
): HexShape {
  return { orientation, cornerOverFlats: corner_mm / flats_mm, gapOverFlats: gap_mm / flats_mm };
}

const NO_FIELD = refused({
  type: 'no-field',
  field: 'electrodes',
  words: 'The field between these electrodes could not be computed.',
});
