import { EMPTY_LOT, EMPTY_SITE, readLot } from '../../src/core.js';
import type { Figure, LotEntry, LotReading, RunEntry, SiteProfile } from '../../src/core.js';
import { Decimal } from '../../src/formula/decimal.js';

// Lots as tests write them down: figures with their units in one text, everything else as in an entry.

/** `12.50 mL` as a figure; a pure number has no unit behind it. */
export function figure(text: string): Figure {
  const [digits = '', ...unit] = text.split(' ');
  return { text: digits, unit: unit.join(' ') };
}

/** A run: the portion, and the burette's start and end in mL. */
export const run = (sample: string, start: string, end: string): RunEntry => ({
  sample: figure(sample), start: figure(`${start} mL`), end: figure(`${end} mL`),
});

const figures = (texts: Readonly<Record<string, string>> = {}): Record<string, Figure> =>
  Object.fromEntries(Object.entries(texts).map(([key, text]) => [key, figure(text)]));

interface Parts {
  readonly figures?: Readonly<Record<string, string>>;
  readonly options?: Readonly<Record<string, string>>;
}

export const lot = (parts: Parts & { readonly runs?: readonly RunEntry[]; readonly retestRuns?: readonly RunEntry[] }): LotEntry => ({
  ...EMPTY_LOT, ...parts, figures: figures(parts.figures), options: parts.options ?? {},
});

export const site = (parts: Parts): SiteProfile => ({ ...EMPTY_SITE, figures: figures(parts.figures), options: parts.options ?? {} });

/** A lot of which a certificate gives the FFA, for what follows from it. */
export const certified = (ffaPercent: string, parts: Parts = {}): LotEntry =>
  lot({
    figures: { oilAmount: '1000 kg', certificateFfa: `${ffaPercent} %`, ...parts.figures },
    options: { acidKnownFrom: 'certificate-ffa', ...parts.options },
  });

/** What the lot reads; a test whose document is not accepted fails with the faults. */
export function read(entry: unknown, profile?: unknown): LotReading {
  const result = readLot(entry, profile);
  if ('faults' in result) throw new Error(JSON.stringify(result.faults));
  return result;
}

/** The full value of a reading; a test that asks for one which is not known fails with the reason. */
export function valueIn({ readings }: LotReading, key: string): Decimal {
  const reading = readings[key];
  if (reading?.value === undefined) throw new Error(`${key}: ${JSON.stringify(reading) ?? 'not read'}`);
  return new Decimal(reading.value);
}

/** The same as a short number, for comparisons with the few digits of a published figure. */
export const numberIn = (reading: LotReading, key: string): number => valueIn(reading, key).toNumber();

/** A reading as it is shown, with its unit. */
export const shownIn = ({ readings }: LotReading, key: string): string => `${readings[key]?.shown ?? '?'} ${readings[key]?.unit ?? ''}`.trimEnd();
