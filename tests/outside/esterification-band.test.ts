import { describe, expect, it } from 'vitest';
import type { LotReading } from '../../src/core.js';
import { certified, numberIn, read } from '../lot/lot.js';
import { HOMOGENISER, ONE_PASS, acidAtStart, acidOfAcid, methanolPerAcid } from './published-esterifications.js';
import type { PublishedPoint } from './published-esterifications.js';

// What "the band holds a published point" means here. The model gives a slow and a fast end of what is left.
// - A point that gives a figure is held when the figure is between the two ends.
// - A point that gives only a limit ("below 1 %") says nothing of how far below it got, so its true result may be anywhere
//   from nothing to the limit. It is held when the fast end is below the limit: then some result that the authors may have
//   had lies inside the band. The slow end may be above the limit; plans use it for that very reason.
// How wet the oil was is not said; every point is computed for a dry oil and for one with 0.10 % water, and must be held in both.

const WATER = ['0', '0.10'] as const;

type Conditions = Pick<PublishedPoint, 'start' | 'methanol' | 'acid' | 'celsius' | 'minutes'>;

function computed(point: Conditions, water: string): LotReading {
  return read(certified((acidAtStart(point) * 28.2).toFixed(6), {
    figures: {
      waterContent: `${water} %`,
      pretreatmentMethanolPerAcid: `${methanolPerAcid(point).toFixed(6)} mol/mol`,
      pretreatmentAcidOfAcid: `${acidOfAcid(point).toFixed(6)} %`,
      pretreatmentTemperature: `${point.celsius} °C`,
      pretreatmentTime: `${point.minutes} min`,
    },
    options: { pretreatmentMethanolBasis: 'per-acid', pretreatmentAcidBasis: 'of-acid' },
  }));
}

/** FFA left after a pass at both ends, %. */
const band = (reading: LotReading, pass = 1): { slow: number; fast: number } => ({
  slow: numberIn(reading, `pass${pass}.ffaLeft.slow`), fast: numberIn(reading, `pass${pass}.ffaLeft.fast`),
});

/** Whether the band holds the point, in the sense said above. */
function isHeld(point: PublishedPoint, water: string): boolean {
  const { slow, fast } = band(computed(point, water));
  const { left } = point;
  if (!('acidValue' in left)) return fast < ('ffaBelow' in left ? left.ffaBelow : (left.acidValueBelow / 56.1) * 28.2);
  const ffa = (left.acidValue / 56.1) * 28.2;
  return fast <= ffa && ffa <= slow;
}

describe('published results after one pass', () => {
  it.each(ONE_PASS)('$source: bases are converted as printed', (point) => {
    // the printed figures are rounded to two digits at best
    expect(Math.abs(methanolPerAcid(point) / point.printed.perAcid - 1)).toBeLessThan(0.05);
    expect(Math.abs(acidOfAcid(point) / point.printed.ofAcid - 1)).toBeLessThan(0.05);
  });

  describe.each(WATER)('with %s %% water', (water) => {
    it.each(ONE_PASS)('$source ($mark)', (point) => {
      expect(isHeld(point, water)).toBe(true);
    });
  });
});

describe('published results after two passes', () => {
  /** More passes than needed are computed by asking for a target that none reaches. */
  const onward = { pretreatmentTarget: '0.000001 %' };

  // Ghadge and Raheman 2005, Biomass Bioenergy 28:601, mahua, FFA 19 % (from memory): 0.30 to 0.35 v/v methanol and 1 % v/v
  // acid in each of two passes, 60 °C, 1 h each; below 1 %
  it.each(WATER)('Ghadge and Raheman 2005, mahua, with %s %% water', (water) => {
    const reading = read(certified('19', {
      figures: { ...onward, waterContent: `${water} %`, pretreatmentMethanolShare: '32.5 %', pretreatmentAcidShare: '1 %' },
      options: { pretreatmentMethanolBasis: 'oil-volume', pretreatmentAcidBasis: 'oil-volume' },
    }));
    const { slow, fast } = band(reading, 2);
    expect(fast).toBeLessThan(1);
    expect(slow).toBeLessThan(1); // here even the slow end gets there
  });

  // Canakci and Van Gerpen 2001, Trans. ASAE 44(6):1429 (found: abstract): yellow grease of 12 % and brown grease of 33 % FFA,
  // below 1 % after two passes. The charge of each, 20 mol/mol and 5 % of the FFA, 60 °C, about 1 h, is from memory.
  it.each(WATER.flatMap((water) => [[water, '12'], [water, '33']] as const))('Canakci and Van Gerpen 2001, with %s %% water, from %s %%', (water, ffa) => {
    const reading = read(certified(ffa, {
      figures: { ...onward, waterContent: `${water} %`, pretreatmentMethanolPerAcid: '20 mol/mol', pretreatmentAcidOfAcid: '5 %' },
      options: { pretreatmentMethanolBasis: 'per-acid', pretreatmentAcidBasis: 'of-acid' },
    }));
    expect(band(reading, 2).fast).toBeLessThan(1);
  });
});

describe('a known miss', () => {
  // The homogeniser's 96.1 % at room temperature is faster than the fast end: the model reaches 75 % there. A machine
  // that shears at 4000 rpm warms what it mixes and is not a stirred vessel; and the temperature and what the 0.7 mol/L
  // are counted on are not clear. The band is not stretched for it; no plan rests on the fast end.
  it('is the oleic acid of a homogeniser', () => {
    const reading = computed(HOMOGENISER, '0');
    const turned = numberIn(reading, 'pass1.conversion.fast');
    expect(turned).toBeLessThan(HOMOGENISER.turned);
    expect(turned).toBeCloseTo(0.75, 2);
    expect(numberIn(reading, 'pass1.equilibrium.fast')).toBeGreaterThan(HOMOGENISER.turned); // its equilibrium allows it
  });
});

const HOMOGENISER_NAME = 'oleic acid in a homogeniser at 25 °C';

describe('the hit rate', () => {
  it('is printed, with what a point says and what is missed', () => {
    const tried = ONE_PASS.map((point) => ({ point, held: WATER.every((water) => isHeld(point, water)) }));
    const figures = tried.filter(({ point }) => 'acidValue' in point.left);
    const limits = tried.filter(({ point }) => !('acidValue' in point.left));
    const count = (points: typeof tried): string => `${points.filter(({ held }) => held).length} of ${points.length}`;
    // a width says what a hit is worth: a band from nothing to all would hold every point
    const widths = ONE_PASS.map((point) => band(computed(point, '0'))).map(({ slow, fast }) => slow / Math.max(fast, 0.01)).sort((a, b) => a - b);
    const missed = [...tried.filter(({ held }) => !held).map(({ point }) => point.source), HOMOGENISER_NAME];
    console.log(
      `Esterification band: holds ${count(figures)} results given as a figure and ${count(limits)} given as “below”, of one pass; ` +
        `its slow end leaves ${widths[0]!.toFixed(1)} to ${widths.at(-1)!.toFixed(0)} times the acid of its fast end, ${widths[Math.floor(widths.length / 2)]!.toFixed(1)} times at the median. Missed: ${missed.join('; ')}.`,
    );
    expect(missed).toEqual([HOMOGENISER_NAME]);
  });
});
