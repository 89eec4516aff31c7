/** Half the edge of the grid: the smallest of three that holds the spot, so that a step never leaves it. */
export function gridHalf_mm(x_mm: number | null, y_mm: number | null): 10 | 50 | 200 {
  const far = Math.max(Math.abs(x_mm ?? 0), Math.abs(y_mm ?? 0));
  return far <= 10 ? 10 : far <= 50 ? 50 : 200;
}

interface Box {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** Millimetres from the centre, right and up positive, whole, of a touch on a square grid of that half edge. */
export function placeOnGrid(
  touch: { readonly clientX: number; readonly clientY: number },
  box: Box,
  half_mm: number,
): { readonly x_mm: number; readonly y_mm: number } {
  const across = (touch.clientX - box.left) / Math.max(1, box.width);
  const down = (touch.clientY - box.top) / Math.max(1, box.height);
  return { x_mm: whole((2 * across - 1) * half_mm, half_mm), y_mm: whole((1 - 2 * down) * half_mm, half_mm) };
}

/** Never minus nought, and never off the grid. */
function whole(mm: number, half_mm: number): number {
  return Math.min(half_mm, Math.max(-half_mm, Math.round(mm))) + 0;
}
