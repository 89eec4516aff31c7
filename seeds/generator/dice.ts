import { uuidFromBytes } from '../../src/domain/book/ids';

/** Chance that repeats: the same seed gives the same month, byte for byte. Nothing secret may be made with it. */
export interface Dice {
  readonly uint32: () => number;
  /** Even between 0 and 1. */
  readonly unit: () => number;
  readonly between: (low: number, high: number) => number;
  /** A whole number, both ends included. */
  readonly whole: (low: number, high: number) => number;
  /** Gaussian with mean 0 and standard deviation 1. */
  readonly normal: () => number;
  readonly pick: <T>(list: readonly [T, ...T[]] | readonly T[]) => T;
  readonly bytes: (count: number) => Uint8Array;
  readonly uuid: () => string;
}

const GOLDEN_STEP = 0x9e3779b9;

/** A counter in golden-ratio steps, stirred by two rounds of multiply and shift: even enough for a demo month. */
export function createDice(seed: number): Dice {
  let counter = seed >>> 0;
  const uint32 = () => {
    counter = (counter + GOLDEN_STEP) >>> 0;
    let mixed = counter;
    mixed = Math.imul(mixed ^ (mixed >>> 16), 0x7feb352d);
    mixed = Math.imul(mixed ^ (mixed >>> 15), 0x846ca68b);
    return (mixed ^ (mixed >>> 16)) >>> 0;
  };
  const unit = () => uint32() / 2 ** 32;
  const whole = (low: number, high: number) => low + Math.floor(unit() * (high - low + 1));
  const bytes = (count: number) => Uint8Array.from({ length: count }, () => uint32() & 0xff);
  return {
    uint32,
    unit,
    whole,
    bytes,
    between: (low, high) => low + unit() * (high - low),
    // Box and Muller; 1 - unit() keeps the logarithm finite.
    normal: () => Math.sqrt(-2 * Math.log(1 - unit())) * Math.cos(2 * Math.PI * unit()),
    pick: (list) => {
      const picked = list[whole(0, list.length - 1)];
      if (picked === undefined) throw new Error('nothing to pick from');
      return picked;
    },
    uuid: () => uuidFromBytes(bytes(16)),
  };
}
