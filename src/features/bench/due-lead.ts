import { paths } from '../../config/paths';
import { ageWords } from '../../domain/report/time-words';
import type { DueItem, DueLead } from '../../domain/rules/due';

/** Where something that is due is mended. */
export function leadPath(lead: DueLead, rig: string): string {
  switch (lead.type) {
    case 'check':
      return paths.checks(rig);
    case 'people':
      return paths.people(rig);
    case 'permit':
    case 'stand-down':
      return paths.deskRig(rig);
    case 'authorisation':
      return paths.crew();
    case 'rig':
      return paths.rig(rig);
    case 'parts':
      return paths.rigParts(rig);
    case 'kit':
      return paths.kit();
    case 'claims':
      return paths.claims();
    case 'firings':
      return paths.firings(rig);
  }
}

/** "in 38 min", "now". Rounded down, so that nothing is due later than it says. */
export function leftWords({ left_ms }: Pick<DueItem, 'left_ms'>): string {
  if (left_ms === null || left_ms < 60_000) return 'now';
  return `in ${ageWords(left_ms)}`;
}

/** What stands in the Bench's own column already is not said twice: the main dome leads there. */
export function besides(
  items: readonly DueItem[],
  primary: { readonly type: string; readonly purpose?: string },
): readonly DueItem[] {
  if (primary.type !== 'open-check' || primary.purpose !== 'make-safe') return items;
  return items.filter((item) => item.key !== 'state');
}
