// Titrations as the law of mass action has them, for checks of what is read from their curves.

/** A strong and a weak acid in one solution, titrated with a strong base; mol/L and mL. */
export interface Titrated {
  readonly strong?: number;
  readonly weak: number;
  readonly pKa: number;
  readonly volume: number;
  readonly base: number;
}

const WATER = 1e-14;

/**
 * pH after so many mL of base, from the exact balance of charges [H⁺] + [Na⁺] = [OH⁻] + [Cl⁻] + [A⁻]
 * (any textbook; Harris, Quantitative Chemical Analysis, ch. 10, from memory), by bisection: the balance falls as pH rises.
 */
export function titratedPH({ strong = 0, weak, pKa, volume, base }: Titrated, added: number): number {
  const all = volume + added;
  const constant = 10 ** -pKa;
  let [low, high] = [-2, 16];
  while (high - low > 1e-12) {
    const middle = (low + high) / 2;
    const h = 10 ** -middle;
    const charge = h + (base * added) / all - WATER / h - (strong * volume) / all - ((weak * volume) / all) * (constant / (constant + h));
    if (charge > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** From zero to the last volume in even steps. */
export const evenSteps = (last: number, steps: number): number[] => Array.from({ length: steps + 1 }, (_, i) => (i * last) / steps);

/** As a dosing burette goes: wide steps, narrow ones from 15 % before the end point on, wide ones again. */
export const dosedSteps = (end: number): number[] => [
  ...evenSteps(end * 0.85, 10), ...Array.from({ length: 30 }, (_, i) => end * (0.86 + 0.01 * i)), ...[1.2, 1.3, 1.4, 1.5].map((share) => share * end),
];
