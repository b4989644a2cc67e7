import type { RouteName } from './route-name.js';

// Where every substance of a batch comes from and where it goes, step by step, as keys of the quantities that say how much.

/** What is charged, carried on, drawn off or left. */
export type Stream = 'oil' | 'methanol' | 'sulfuricAcid' | 'catalyst' | 'mixture' | 'neutralisingAcid' | 'drawnOff' | 'esterLayer' | 'glycerolLayer';

/** A substance of the balance. `catalyst` is what still drives the reaction, counted as it was charged; `solids` are insolubles and what a catalyst brings beside alkali, water and methanol. */
export const COMPONENTS = [
  'glycerides', 'freeAcid', 'ester', 'glycerol', 'soap', 'methanol', 'water', 'catalyst', 'sulfuricAcid', 'sulfate', 'neutralisingAcid', 'salt', 'solids',
] as const;
export type Component = (typeof COMPONENTS)[number];

/** A pass of the acid step; the retest, which puts what was titrated in the place of the prediction; the base step; neutralising and settling. */
export type StepName = 'pass1' | 'pass2' | 'pass3' | 'retest' | 'react' | 'settle';

/** A substance in a stream, and the key of its mass. */
export interface Flow {
  readonly stream: Stream;
  readonly component: Component;
  readonly key: string;
}

/** A product as it is charged, and the key of its mass. */
export interface Charged {
  readonly stream: Stream;
  readonly key: string;
}

/** A layer that a step leaves, and the keys of its mass and its volume. */
export interface Layer {
  readonly stream: Stream;
  readonly mass: string;
  readonly volume: string;
}

/** A step with all that goes in and comes out. */
export interface StepFlows {
  readonly step: StepName;
  readonly in: readonly Flow[];
  readonly out: readonly Flow[];
  readonly charged: readonly Charged[];
  readonly layers: readonly Layer[];
  /** Keys of what goes in altogether, of what comes out, and of the difference. */
  readonly totals: { readonly in: string; readonly out: string; readonly difference: string };
}

const flows = (stream: Stream, keys: Partial<Record<Component, string>>): readonly Flow[] =>
  Object.entries(keys).map(([component, key]) => ({ stream, component: component as Component, key }));

const OIL = flows('oil', { glycerides: 'balance.glycerides', freeAcid: 'balance.freeAcid', water: 'balance.water', solids: 'balance.insolubles' });

/** The oil as a pass leaves it, by the cautious end of the prediction: the charges are planned with that. */
const carried = (pass: number): readonly Flow[] =>
  flows('oil', {
    glycerides: 'balance.glycerides', freeAcid: `balance.pass${pass}.freeAcid`, ester: `balance.pass${pass}.ester`, methanol: `balance.pass${pass}.methanol`,
    water: `balance.pass${pass}.water`, sulfuricAcid: `pass${pass}.sulfuricCarried`, solids: 'balance.insolubles',
  });

/** The oil as the base step counts it: as predicted, or as it was titrated after the acid step. */
const PRETREATED = flows('oil', {
  glycerides: 'balance.glycerides', freeAcid: 'twoStep.acidToSoap', ester: 'pretreated.ester', methanol: 'balance.pretreated.methanol',
  water: 'balance.pretreated.water', sulfuricAcid: 'balance.pretreated.sulfuricAcid', solids: 'balance.insolubles',
});

/** Charging a pass of the acid step, esterifying, drawing the methanol layer off. */
export function passFlows(pass: 1 | 2 | 3): StepFlows {
  const [own, key] = [`pass${pass}`, `balance.pass${pass}`];
  return {
    step: `pass${pass}`,
    in: [
      ...(pass === 1 ? OIL : carried(pass - 1)),
      ...flows('methanol', { methanol: `${own}.methanolPure`, water: `${key}.waterOfMethanol` }),
      ...flows('sulfuricAcid', { sulfuricAcid: `${own}.sulfuricPure`, water: `${key}.waterOfSulfuric` }),
    ],
    out: [...carried(pass), ...flows('drawnOff', { methanol: `${key}.methanolDrawn`, water: `${key}.waterDrawn`, sulfuricAcid: `${key}.sulfuricDrawn` })],
    charged: [{ stream: 'methanol', key: `${own}.methanol` }, { stream: 'sulfuricAcid', key: `${own}.sulfuric` }],
    layers: [
      { stream: 'drawnOff', mass: `${key}.drawnMass`, volume: `${key}.drawnVolume` },
      { stream: 'oil', mass: `${key}.oilMass`, volume: `${key}.oilVolume` },
    ],
    totals: { in: `${key}.in`, out: `${key}.out`, difference: `${key}.difference` },
  };
}

/** Not a step of the plant: what the oil was predicted to hold, and what the base step counts in it after the titration. */
export const retestFlows = (passes: number): StepFlows => ({
  step: 'retest', in: carried(passes), out: PRETREATED, charged: [], layers: [],
  totals: { in: 'pretreated.mass', out: 'balance.retest.out', difference: 'balance.retest.difference' },
});

/** The base step: methanol and catalyst charged, the reaction run. */
export function reactionFlows(route: RouteName): StepFlows {
  const key = `balance.${route}`;
  return {
    step: 'react',
    in: [
      ...(route === 'direct' ? OIL : PRETREATED),
      ...flows('methanol', { methanol: `${key}.methanolPure`, water: `${key}.waterOfMethanol` }),
      ...flows('catalyst', { catalyst: `${key}.catalystPure`, methanol: `${route}.methanolFromCatalyst`, water: `${key}.waterOfCatalyst`, solids: `${key}.restOfCatalyst` }),
    ],
    out: mixture(route),
    charged: [{ stream: 'methanol', key: `${route}.methanol` }, { stream: 'catalyst', key: `${route}.catalyst` }],
    layers: [],
    totals: { in: `${key}.reactionIn`, out: `${key}.reactionOut`, difference: `${key}.reactionDifference` },
  };
}

const mixture = (route: RouteName): readonly Flow[] =>
  flows('mixture', {
    glycerides: `after.${route}.glyceridesLeft`, ester: `${route}.ester`, glycerol: `${route}.glycerol`, soap: `${route}.soap`, methanol: `balance.${route}.methanolReacted`,
    water: `balance.${route}.waterReacted`, catalyst: `${route}.basePure`, sulfate: `after.${route}.sulfate`, solids: `after.${route}.solids`,
  });

/** Neutralising the catalyst left, and settling into the ester layer and the glycerol layer. */
export function settlingFlows(route: RouteName): StepFlows {
  const [after, key] = [`after.${route}`, `balance.${route}`];
  return {
    step: 'settle',
    in: [...mixture(route), ...flows('neutralisingAcid', { neutralisingAcid: `${after}.acidPure`, water: `${key}.waterOfAcid` })],
    out: [
      ...flows('esterLayer', { glycerides: `${after}.glyceridesLeft`, ester: `${after}.ester`, methanol: `${key}.methanolUpper` }),
      ...flows('glycerolLayer', {
        ester: `${key}.esterLower`, glycerol: `${route}.glycerol`, soap: `${route}.soap`, methanol: `${after}.methanolLower`, water: `${after}.water`,
        sulfate: `${after}.sulfate`, salt: `${after}.salt`, solids: `${after}.solids`,
      }),
    ],
    charged: [{ stream: 'neutralisingAcid', key: `${after}.acid` }],
    layers: [
      { stream: 'esterLayer', mass: `${after}.upperMass`, volume: `${after}.upperVolume` },
      { stream: 'glycerolLayer', mass: `${after}.lowerMass`, volume: `${after}.lowerVolume` },
    ],
    totals: { in: `${key}.settlingIn`, out: `${key}.settlingOut`, difference: `${key}.settlingDifference` },
  };
}

/**
 * The steps of a route, in order.
 *
 * @param passes of the acid step, 1 to 3; for the direct route nothing turns on it
 * @param retested whether the base step rests on a titration after the acid step
 */
export function balanceSteps(route: RouteName, passes: number, retested: boolean): readonly StepFlows[] {
  const acidStep = route === 'direct' ? [] : [...([1, 2, 3] as const).filter((pass) => pass <= passes).map(passFlows), ...(retested ? [retestFlows(passes)] : [])];
  return [...acidStep, reactionFlows(route), settlingFlows(route)];
}
