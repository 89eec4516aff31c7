/** Halving ends here: 200 halvings exhaust a double from any start, so a loop can never hang. */
const MOST_HALVINGS = 200;

/**
 * The border of a condition that is false at one end of an interval and true at the other. Works across a
 * jump. The point given back is on the side where the condition holds, so a limit found this way is kept.
 */
export function borderOf(
  holds: (x: number) => boolean,
  end: { readonly fails: number; readonly holds: number },
): number {
  let { fails, holds: good } = end;
  for (let step = 0; step < MOST_HALVINGS; step += 1) {
    const middle = 0.5 * (fails + good);
    if (middle === fails || middle === good) break;
    if (holds(middle)) good = middle;
    else fails = middle;
  }
  return good;
}
