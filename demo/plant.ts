import type { BlendStock } from 'esterway';
import type { SiteProfile } from 'esterway/core';

const mL = (text: string) => ({ text, unit: 'mL' });

/** What the invented plant has set once: its titrant, its burette, its vessel. */
export const plant: SiteProfile = {
  version: 1,
  name: 'Quillmarsh Oil Recovery',
  figures: {
    vesselVolume: { text: '2500', unit: 'L' },
    methanolStep: { text: '1', unit: 'L' },
    catalystStep: { text: '50', unit: 'g' },
    sulfuricStep: { text: '50', unit: 'g' },
  },
  options: { titrantKnownFrom: 'standardised', burette: 'A-25' },
  titrantDate: '2026-03-02',
  titrantRuns: [
    { sample: { text: '0.5121', unit: 'g' }, start: mL('0.00'), end: mL('25.00') },
    { sample: { text: '0.5098', unit: 'g' }, start: mL('0.00'), end: mL('24.90') },
  ],
};

const tank = (name: string, mass: string, ffa: string, price: string, water: string) => ({
  name, mass: { text: mass, unit: 'kg' }, freeFattyAcid: { text: ffa, unit: '%' }, cost: { text: price, unit: '¤/kg' }, water: { text: water, unit: '%' },
});

/** What stands in the invented plant's tanks. */
export const stock: BlendStock = {
  version: 1,
  items: [tank('Tank 1', '6400', '1.2', '0.78', '0.04'), tank('Tank 3', '2900', '2.1', '0.71', '0.07'), tank('IBC row', '3000', '5.8', '0.46', '0.12')],
  limits: { water: { text: '0.10', unit: '%' }, mass: { text: '5', unit: 't' } },
  goal: 'use-sour',
};
