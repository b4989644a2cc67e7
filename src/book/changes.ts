import type { LotEntry, RunEntry, SiteProfile } from '../lot/entry.js';
import type { Figure } from '../lot/figure.js';
import type { LotRecord } from './record.js';
import { sameJson } from './same.js';

/** A part of a lot that two versions have otherwise. */
export interface BookChange {
  readonly in: 'entry' | 'site';
  /** `name`, `date`, a figure, an option, or a run's cell `run1.end`, `retest.run2.struck`. */
  readonly field: string;
  /** Whether before and after are words of an option. */
  readonly option: boolean;
  /** As typed; not there where the field was empty. */
  readonly before?: BookText;
  readonly after?: BookText;
}

/** A figure, or other text. */
export type BookText = Figure | string;

type Parts = Readonly<Record<string, BookText>>;
type Side = Pick<LotRecord, 'entry' | 'site'>;

/** What is different from one version to another, field by field, in the order of the lot. */
export function changesBetween(before: Side, after: Side): readonly BookChange[] {
  return [
    ...changed('entry', partsOfEntry(before.entry), partsOfEntry(after.entry), false),
    ...changed('entry', before.entry.options, after.entry.options, true),
    ...changed('site', partsOfSite(before.site), partsOfSite(after.site), false),
    ...changed('site', before.site.options, after.site.options, true),
  ];
}

function changed(where: BookChange['in'], before: Parts, after: Parts, option: boolean): readonly BookChange[] {
  const fields = new Set([...Object.keys(before), ...Object.keys(after)]);
  return [...fields].filter((field) => !sameJson(before[field], after[field])).map((field) => ({
    in: where, field, option,
    ...(before[field] !== undefined && { before: before[field] }), ...(after[field] !== undefined && { after: after[field] }),
  }));
}

function partsOfEntry({ name, source, date, figures, runs, retestRuns }: LotEntry): Parts {
  return { ...texts({ name, source, date }), ...figures, ...runParts('run', runs), ...runParts('retest.run', retestRuns) };
}

function partsOfSite({ name, titrantDate, figures, titrantRuns = [] }: SiteProfile): Parts {
  return { ...texts({ name, titrantDate }), ...figures, ...runParts('titrant.run', titrantRuns) };
}

const texts = (of: Readonly<Record<string, string | undefined>>): Parts =>
  Object.fromEntries(Object.entries(of).flatMap(([field, text]) => (text ? [[field, text]] : [])));

const runParts = (prefix: string, runs: readonly RunEntry[]): Parts =>
  Object.fromEntries(runs.flatMap((run, index) => Object.entries(run).map(([cell, part]: [string, BookText]) => [`${prefix}${index + 1}.${cell}`, part])));
