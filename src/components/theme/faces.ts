import { electrodeMask } from '../electrode';

/**
 * Text of `faces.css`. A style sheet cannot call the profile, so the sheet is this function's output kept as a file; the test of
 * the profile compares the two and says so when the profile moved without the sheet.
 */
export function facesCss(): string {
  const narrow = { width: 14, height: 70, edge: 5 } as const;
  return `/* Written by faces.ts: change the profile in electrode.ts, then write this file anew. */
:root {
  --face-right: ${electrodeMask({ ...narrow, facing: 'right' })};
  --face-left: ${electrodeMask({ ...narrow, facing: 'left' })};
}
`;
}
