import type { ErrorShape } from './uncertainty-source.js';

/** A repeatable source of chance: the same seed gives the same draws on every machine. */
export interface Random {
  /** Evenly spread over 0 to 1, neither end included. */
  uniform(): number;
  /** An error of the given shape about zero, of standard deviation one. */
  error(shape: ErrorShape): number;
}

/**
 * The four-cycle generator that JCGM 101, C.3 recommends: Wichmann and Hill 2006, Generating good
 * pseudo-random numbers, Comput. Stat. Data Anal. 51:1614 (constants from memory; a test proves that
 * their cycles are full). Its period is about 2^120. Each product is split by Schrage's method, so that
 * it stays within 32 bits.
 *
 * @param seed a whole number from 0 to 2^32 − 1
 */
export function seededRandom(seed: number): Random {
  let [a, b, c, d] = CYCLES.map(({ modulus }, at) => 1 + (scattered(seed + at) % (modulus - 1))) as [number, number, number, number];
  let spare: number | undefined;

  const uniform = (): number => {
    a = 11600 * (a % 185127) - 10379 * ((a / 185127) | 0);
    b = 47003 * (b % 45688) - 10479 * ((b / 45688) | 0);
    c = 23000 * (c % 93368) - 19423 * ((c / 93368) | 0);
    d = 33000 * (d % 65075) - 8123 * ((d / 65075) | 0);
    if (a < 0) a += 2147483579;
    if (b < 0) b += 2147483543;
    if (c < 0) c += 2147483423;
    if (d < 0) d += 2147483123;
    const sum = a / 2147483579 + b / 2147483543 + c / 2147483423 + d / 2147483123;
    return sum - Math.floor(sum) || uniform();
  };

  /** Box and Muller's pair of normal draws (JCGM 101, C.4), one of them kept for the next call. */
  const normal = (): number => {
    if (spare !== undefined) {
      const kept = spare;
      spare = undefined;
      return kept;
    }
    const radius = Math.sqrt(-2 * Math.log(uniform()));
    const angle = 2 * Math.PI * uniform();
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };

  return {
    uniform,
    error(shape) {
      switch (shape) {
        case 'normal':
          return normal();
        case 'rectangular': // half-width √3 u
          return Math.sqrt(3) * (2 * uniform() - 1);
        case 'triangular': // half-width √6 u, the sum of two even draws (JCGM 101, 6.4.5)
          return Math.sqrt(6) * (uniform() + uniform() - 1);
      }
    },
  };
}

/** The multipliers and prime moduli of the four cycles. */
export const CYCLES = [
  { multiplier: 11600, modulus: 2147483579 },
  { multiplier: 47003, modulus: 2147483543 },
  { multiplier: 23000, modulus: 2147483423 },
  { multiplier: 33000, modulus: 2147483123 },
] as const;

/** Neighbouring seeds far apart: the last steps of MurmurHash3 (Appleby), 0 to 2^32 − 1. */
function scattered(seed: number): number {
  let mixed = Math.imul(seed + 1, 0x9e3779b1);
  mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
  mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
  return (mixed ^ (mixed >>> 16)) >>> 0;
}
