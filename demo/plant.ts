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
