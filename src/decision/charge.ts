import type { RouteName } from '../chemistry/route-name.js';

/** What goes into the vessel, or is done with it. */
export type ChargeWhat = 'oil' | 'pretreated-oil' | 'methanol' | 'sulfuric-acid' | 'catalyst' | 'mix-methoxide' | 'cool' | 'settle' | 'retest';

/** A line of a charge, in order of addition. */
export interface ChargeLine {
  readonly what: ChargeWhat;
  /** Key of the quantity to weigh, kg. */
  readonly mass?: string;
  /** Key of the same amount by volume, L. */
  readonly volume?: string;
}

/** Code of a caution that stands at a step; the locale has its words. */
export const CAUTIONS = ['methanol', 'caustic-into-methanol', 'acid-into-oil', 'closed-vessel', 'layers-are-hazardous', 'defer'] as const;
export type Caution = (typeof CAUTIONS)[number];

/** A step of a route: what to charge in which order, and the cautions that belong to it. */
export interface ChargeStep {
  readonly step: 'acid' | 'base';
  /** Number of the pass of an acid step. */
  readonly pass?: number;
  readonly lines: readonly ChargeLine[];
  readonly cautions: readonly Caution[];
}

/** The base step alone: methanol first, the caustic into it, the mixture into the warm oil. */
export function directCharge(): readonly ChargeStep[] {
  return [baseStep('direct', [{ what: 'oil', mass: 'oilMass', volume: 'oilVolume' }])];
}

/** So many passes of the acid step, each settled and drawn off; then a retest; then the base step. */
export function twoStepCharge(passes: number): readonly ChargeStep[] {
  const acidSteps = Array.from({ length: passes }, (_, i): ChargeStep => {
    const pass = i + 1;
    return {
      step: 'acid',
      pass,
      lines: [
        pass === 1 ? { what: 'oil', mass: 'oilMass', volume: 'oilVolume' } : { what: 'cool' },
        { what: 'methanol', mass: `pass${pass}.methanol`, volume: `pass${pass}.methanolVolume` },
        { what: 'sulfuric-acid', mass: `pass${pass}.sulfuric`, volume: `pass${pass}.sulfuricVolume` },
        { what: 'settle' },
        ...(pass === passes ? [{ what: 'retest' } as const] : []),
      ],
      cautions: ['methanol', 'acid-into-oil', 'closed-vessel', 'layers-are-hazardous'],
    };
  });
  return [...acidSteps, baseStep('twoStep', [{ what: 'pretreated-oil', mass: 'pretreated.mass' }])];
}

const baseStep = (route: RouteName, oil: readonly ChargeLine[]): ChargeStep => ({
  step: 'base',
  lines: [
    ...oil,
    { what: 'methanol', mass: `${route}.methanol`, volume: `${route}.methanolVolume` },
    { what: 'catalyst', mass: `${route}.catalyst`, volume: `${route}.catalystVolume` },
    { what: 'mix-methoxide' },
  ],
  cautions: ['methanol', 'caustic-into-methanol', 'closed-vessel', 'layers-are-hazardous', 'defer'],
});
