import type { Missing } from '../../domain/rules/readiness';

/** Who can mend it, as it stands behind the missing thing. */
export function menderWords({ mend }: Missing): string {
  switch (mend) {
    case 'you':
      return 'you can mend it';
    case 'reviewer':
      return 'a reviewer can mend it';
    case 'lead':
      return 'a lead can mend it';
    case 'whoever has hands in':
      return 'whoever has hands in can mend it';
    case 'a newer app':
      return 'a newer version of the app can mend it';
  }
}

/** A check that does not count is mended by walking one; the tablet fills its Book by itself. */
export function mendedByCheck({ mend, code }: Missing): boolean {
  return mend === 'you' && code !== 'filling';
}
