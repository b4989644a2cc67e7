import 'esterway/define';
import type { LotEntry } from 'esterway/core';
import { deliveries } from './lots.ts';
import { plant } from './plant.ts';
import { applyToPage, readSettings } from './settings.ts';

const bench = document.querySelector<HTMLElementTagNameMap['esterway-site']>('#bench')!;
const working = bench.querySelector('esterway-working')!;
const form = document.querySelector<HTMLFormElement>('#form')!;
const field = form.querySelector('esterway-titration')!;
const sent = document.querySelector('#sent')!;

// the page itself speaks English only
const settings = { ...readSettings(), lang: 'en' } as const;
applyToPage(settings);
bench.units = settings.units;
bench.site = plant;

const { entry } = deliveries.find(({ id }) => id === 'borderline')!;
const oil = { text: '900', unit: 'kg' };
bench.entry = { ...entry, name: 'Tank 2', figures: { ...entry.figures, oilAmount: oil } };

bench.addEventListener('esterway-open', ({ key }) => {
  working.folded = false;
  working.of = key;
  working.scrollIntoView({ block: 'nearest' });
});

/** A lot of which nothing is known yet; the plant has its titrant. */
const begun: LotEntry = { version: 1, figures: {}, options: entry.options, runs: [], retestRuns: [] };
field.site = plant;
field.entry = begun;

form.addEventListener('submit', (event) => {
  event.preventDefault();
  sent.textContent = [...new FormData(form)].map(([name, value]) => `${name} = ${typeof value === 'string' ? value : value.name}`).join('\n');
});
form.addEventListener('reset', () => {
  sent.textContent = 'Nothing yet.';
});
