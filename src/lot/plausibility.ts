import { runKey } from '../chemistry/lot-formulas.js';
import type { RunPrefix } from '../chemistry/lot-formulas.js';
import { PORTIONS } from '../chemistry/titration-plan.js';
import { portionFits, portionFor } from '../decision/portion-table.js';
import { Decimal, decimal } from '../formula/decimal.js';
import { isKnown } from '../formula/reading.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { fieldOf } from './keys.js';
import type { Notice, NoticeCode } from './lot-reading.js';
import type { LotRun } from './lot-run.js';

// Figures that can be, and yet deserve a second look: each remark says at which field, and why.

const LEAST_TITRE = decimal('1');
const MOST_BLANK = decimal('0.1');
const USUAL_STRENGTH = [decimal('0.01'), decimal('1.5')] as const;
const MOST_TEMPERATURE_GAP = decimal('3');
const TENFOLD = decimal('5');
/** Nobody standardises against a salt of less; a figure below is a fraction typed as a per cent. */
const LEAST_PURITY = decimal('2');
/** Coconut and palm kernel oil lie above, all others below (Codex Stan 210; from memory). */
const LAURIC_SAPONIFICATION = decimal('225');
/** The catalyst is slow to dissolve from here on. */
const NEAR_SATURATION = decimal('0.8');

type Say = (code: NoticeCode, quantity: string, params?: Readonly<Record<string, Decimal | string>>) => void;
type Find = (key: string) => Decimal | undefined;

/** @param today the day of reading, ISO 8601, where it is known */
export function implausibilities(entry: LotEntry, site: SiteProfile, run: LotRun, today: string | undefined): readonly Notice[] {
  const notices: Notice[] = [];
  const say: Say = (code, quantity, params) => {
    const words = params && { params: Object.fromEntries(Object.entries(params).map(([name, value]) => [name, value.toString()])) };
    notices.push({ code, quantity, ...words });
  };
  const find: Find = (key) => {
    const outcome = run.sheet.quantities.has(key) ? run.findings.outcome(key) : undefined;
    return outcome && isKnown(outcome) ? outcome : undefined;
  };
  if (run.givens.chosen('acidKnownFrom') === 'titration') {
    runs('', run.runs.lot.counted, run, find, say);
    titrant(site, entry, run, find, say, today);
    bench(entry, run, find, say);
  }
  runs('retest.', entry.retestRuns.length ? run.runs.retest.counted : [], run, find, say);
  if (run.givens.hasRetest()) retest(find, say);
  oil(run, find, say);
  batch(find, say);
  if (today !== undefined && isLater(entry.date, today)) say('date-in-future', 'date', { today });
  return notices;
}

/** Titres in the good part of the burette, portions as the method has them, runs of one order of size. */
function runs(prefix: RunPrefix, counted: readonly number[], { givens }: LotRun, find: Find, say: Say): void {
  const capacity = find('buretteCapacity');
  const table = PORTIONS[givens.chosen('portionTable') as keyof typeof PORTIONS];
  for (const index of counted) {
    const key = (name: string): string => runKey(prefix, index, name);
    const [titre, end, mass, acidValue] = ['titre', 'buretteEnd', 'sampleMass', 'acidValue'].map((name) => find(key(name)));
    const run = String(index + 1);
    if (titre?.lt(LEAST_TITRE)) say('titre-small', fieldOf(key('buretteEnd')), { run, titre });
    if (capacity && (end?.gt(capacity) || titre?.gt(capacity))) say('titre-above-burette', fieldOf(key('buretteEnd')), { run, capacity });
    if (mass && acidValue && !portionFits(mass, acidValue, table)) {
      say('portion-unusual', fieldOf(key('sampleMass')), { run, mass, wanted: portionFor(acidValue, table), acidValue });
    }
  }
  const contents = counted.flatMap((index) => find(runKey(prefix, index, 'acidContent')) ?? []);
  if (contents.length > 1 && Decimal.max(...contents).gt(Decimal.min(...contents).times(TENFOLD))) say('runs-tenfold', `${prefix}acidValue`);
}

/** The acid step makes no acid. */
function retest(find: Find, say: Say): void {
  const [before, after] = [find('freeFattyAcid'), find('retest.freeFattyAcid')];
  if (before && after?.gt(before)) say('retest-higher', 'retest.acidValue', { before, after });
}

function titrant(site: SiteProfile, entry: LotEntry, { givens, runs: { titrant: plan } }: LotRun, find: Find, say: Say, today: string | undefined): void {
  const from = givens.chosen('titrantKnownFrom');
  if (from === 'weighing') say('titrant-not-standardised', 'titrantStrength');
  const strength = find('titrantConcentration');
  const unusual = (value: Decimal): boolean => value.lt(USUAL_STRENGTH[0]) || value.gt(USUAL_STRENGTH[1]);
  const molarMass = find('titrantMolarMass');
  if (strength && molarMass && unusual(strength)) {
    const inGrams = find('titrantMassStrength') !== undefined && from === 'label';
    const meant = inGrams ? strength.times(molarMass) : strength.div(molarMass);
    const code = from !== 'label' || unusual(meant) ? 'strength-unlikely' : inGrams ? 'strength-perhaps-moles' : 'strength-perhaps-grams';
    say(code, 'titrantStrength', { strength: code === 'strength-perhaps-moles' ? meant : strength });
  }
  const purity = find('khpPurity');
  if (from !== 'standardised') return;
  if (purity?.lt(LEAST_PURITY)) say('purity-as-fraction', 'khpPurity', { meant: purity.times(100) });
  const [range, critical] = [find('titrant.range'), find('titrant.criticalRange')];
  if (range && critical && range.gt(critical)) say('standardisation-differs', 'titrantStrength', { range, critical, runs: String(plan.counted.length) });
  age(site, entry, find, say, today);
}

/** How many days the titrant has stood at the day of the lot. */
function age({ titrantDate }: SiteProfile, entry: LotEntry, find: Find, say: Say, today: string | undefined): void {
  const made = dayOf(titrantDate);
  if (made === undefined) return say('titrant-age-unknown', 'titrantDate');
  if (today !== undefined && isLater(titrantDate, today)) return say('date-in-future', 'titrantDate', { today });
  const used = dayOf(entry.date) ?? dayOf(today);
  const limit = find('titrantAgeLimit');
  if (used === undefined || !limit) return;
  const days = used - made;
  if (limit.lt(days)) say('titrant-old', 'titrantDate', { days: String(days), limit });
}

function bench(entry: LotEntry, { givens, runs: { lot, retest } }: LotRun, find: Find, say: Say): void {
  const titresOf = (prefix: RunPrefix, counted: readonly number[]): Decimal[] => counted.flatMap((index) => find(runKey(prefix, index, 'titre')) ?? []);
  const titres = [...titresOf('', lot.counted), ...titresOf('retest.', entry.retestRuns.length ? retest.counted : [])].filter((titre) => titre.gt(0));
  const blank = givens.chosen('blankPolicy') === 'blank-subtracted' && titres.length ? find('blank') : undefined;
  if (blank) {
    const share = blank.div(Decimal.min(...titres));
    if (share.gt(MOST_BLANK)) say('blank-large', 'blank', { share: share.times(100) });
  }
  if (givens.chosen('temperatureCorrected') === 'yes' || !givens.temperatureTaken()) return;
  const [now, then] = [find('titrationTemperature'), find('standardisationTemperature')];
  const gap = now && then ? now.minus(then).abs() : undefined;
  if (gap?.gt(MOST_TEMPERATURE_GAP)) say('temperature-not-corrected', 'titrationTemperature', { gap });
}

function oil({ givens }: LotRun, find: Find, say: Say): void {
  if (givens.chosen('referenceAcid') === 'lauric') return;
  const byFat = givens.chosen('glyceridesBy') === 'profile';
  if (byFat ? givens.chosen('fat') === 'coconut' : find('saponificationValue')?.gt(LAURIC_SAPONIFICATION)) say('lauric-on-other-basis', 'referenceAcid');
}

function batch(find: Find, say: Say): void {
  const working = find('vesselWorkingVolume');
  for (const step of ['direct', 'pass1']) {
    const volume = find(`${step}.batchVolume`);
    if (working && volume?.gt(working)) say('batch-above-vessel', `${step}.batchVolume`, { volume, working });
  }
  for (const route of ['direct', 'twoStep']) {
    const [water, most] = [find(`${route}.waterShare`), find('batchWaterLimit')];
    if (water && most && water.gt(most)) say('batch-too-wet', `${route}.waterShare`, { water, limit: most });
    const [soap, bearable] = [find(`${route}.soapShare`), find('soapLimit')];
    if (soap && bearable && soap.gt(bearable)) say('soap-above-limit', `${route}.soapShare`, { soap, limit: bearable });
  }
  const solubility = find('catalystSolubility');
  for (const route of ['direct', 'twoStep']) {
    const load = find(`${route}.catalystInMethanol`);
    if (solubility && load?.gt(solubility.times(NEAR_SATURATION))) {
      say('methanol-little-for-catalyst', `${route}.catalyst`, { load, solubility });
    }
  }
}

/** Days since 1970 of an ISO 8601 date; undefined for what is no date. */
function dayOf(date: string | undefined): number | undefined {
  const time = Date.parse(`${date ?? ''}T00:00:00Z`);
  return Number.isNaN(time) ? undefined : time / 86_400_000;
}

function isLater(date: string | undefined, than: string): boolean {
  const [day, other] = [dayOf(date), dayOf(than)];
  return day !== undefined && other !== undefined && day > other;
}
