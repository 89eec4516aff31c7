/** Long enough to read a label across the HV area, short enough to be handed over; px along the longer side. */
export const PHOTO_SIDE_PX = 1600;

export interface PhotoSize {
  readonly width: number;
  readonly height: number;
}

/** Keeps the shape, never enlarges. */
export function photoSize({ width, height }: PhotoSize): PhotoSize {
  const share = Math.min(1, PHOTO_SIDE_PX / Math.max(width, height, 1));
  return { width: Math.max(1, Math.round(width * share)), height: Math.max(1, Math.round(height * share)) };
}

/** "312 kB" */
export function bytesWords(bytes: number): string {
  const kB = Math.ceil(bytes / 1000);
  return kB < 1000 ? `${kB}\u2009kB` : `${Math.ceil(kB / 100) / 10}\u2009MB`;
}
