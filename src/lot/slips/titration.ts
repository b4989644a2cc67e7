import type { RunEntry } from '../entry.js';
import { each, per, times, to } from '../slips.js';
import type { Changes, CheckedFigure, Slip } from '../slips.js';

/** Slips in working out an acid content, in the first titration or in the retest. */
export const titrationSlips = (figure: CheckedFigure): readonly Slip[] =>
  (['', 'retest.'] as const).flatMap((prefix) => {
    const slips = [...ofRuns(figure, prefix), ...ofResult(figure, prefix)];
    return prefix ? slips.map((slip) => ({ ...slip, params: { ...slip.params, titration: 'retest' } })) : slips;
  });

function ofRuns(figure: CheckedFigure, prefix: '' | 'retest.'): readonly Slip[] {
  if (figure.option(`${prefix}acidKnownFrom`) !== 'titration') return [];
  const plan = prefix ? figure.run.runs.retest : figure.run.runs.lot;
  const list = prefix ? 'retestRuns' : 'runs';
  const runs = Array.from({ length: Math.max(1, plan.runs) }, (_, i) => `${prefix}run${i + 1}.`);
  const content = `${prefix}acidContent`;
  const byVolume = figure.option('sampleTakenBy') === 'volume';
  const byAmount = figure.option('titrantStrengthBy') === 'amount';
  const netTitre = (blanks: string): Changes =>
    each(runs, (run) => ({ [`${run}netTitre`]: (_, of) => of(`${run}correctedTitre`).minus(of('correctedBlank').times(blanks)) }));
  return [
    { code: 'blank-left-out', topic: 'blank', replaced: netTitre('0') },
    { code: 'blank-added', topic: 'blank', replaced: netTitre('-1') },
    { code: 'blank-twice', topic: 'blank', replaced: netTitre('2') },
    { code: 'burette-start-ignored', topic: 'burette', replaced: each(runs, (run) => ({ [`${run}titre`]: to(`${run}buretteEnd`) })) },
    ...(plan.counted.length > 1 ? plan.counted : []).map((index): Slip => (
      { code: 'one-run', topic: 'runs', params: { run: String(index + 1) }, replaced: { [`${prefix}titratedAcidContent`]: to(`${runs[index]}acidContent`) } }
    )),
    ...figure.entry[list].flatMap(({ struck }, index): Slip[] => (struck === undefined ? [] : [
      {
        code: 'struck-run-counted', topic: 'runs', params: { run: String(index + 1) }, options: { [`${prefix}averageBy`]: 'mean' },
        entry: (entry) => ({ ...entry, [list]: entry[list].map((run, i) => (i === index ? counting(run) : run)) }),
      },
    ])),
    ...(plan.counted.length > 2 ? figure.others(`${prefix}averageBy`) : []).map((average): Slip => (
      { code: 'other-average', topic: 'runs', params: { average }, options: { [`${prefix}averageBy`]: average } }
    )),
    byVolume
      ? { code: 'volume-as-mass', topic: 'sample', replaced: each(runs, (run) => ({ [`${run}sampleMass`]: to(`${run}sampleVolume`) })) }
      : { code: 'mass-as-volume', topic: 'sample', replaced: each(runs, (run) => ({ [`${run}sampleMass`]: times('sampleDensity') })) },
    // on the result, which is in proportion: as a strength most of it would be refused on the way
    ...(figure.option('titrantKnownFrom') === 'label'
      ? [byAmount
          ? { code: 'strength-as-grams', topic: 'strength', replaced: { [content]: per('titrantMolarMass') } } as const
          : { code: 'strength-as-moles', topic: 'strength', replaced: { [content]: times('titrantMolarMass') } } as const]
      : []),
  ];
}

const counting = ({ sample, start, end }: RunEntry): RunEntry => ({ ...(sample && { sample }), ...(start && { start }), ...(end && { end }) });

function ofResult(figure: CheckedFigure, prefix: '' | 'retest.'): readonly Slip[] {
  const [content, acidValue, ffa] = ['acidContent', 'acidValue', 'freeFattyAcid'].map((name) => prefix + name) as [string, string, string];
  // FFA and acid value are both in proportion to the acid content
  const ratio = figure.value(ffa).div(figure.value(acidValue));
  return [
    { code: 'ffa-as-acid-value', topic: 'acid', replaced: { [content]: (normal) => normal.times(ratio) } },
    { code: 'acid-value-as-ffa', topic: 'acid', replaced: { [content]: (normal) => normal.div(ratio) } },
    {
      code: 'acid-value-as-sodium-hydroxide', topic: 'acid',
      replaced: { [acidValue]: (_, of) => of(content).times(figure.with([{ options: { titrantAlkali: 'NaOH' } }], 'titrantMolarMass')) },
    },
  ];
}

/** Slips with what both titrations share: titrant, temperature, reference acid. */
export const benchSlips = (figure: CheckedFigure): readonly Slip[] => [
  { code: 'temperature-left-out', topic: 'temperature', options: { temperatureTaken: 'no' } },
  { code: 'temperature-reversed', topic: 'temperature', replaced: { volumeFactor: (normal) => normal.negated().plus(2) } },
  ...figure.others('titrantAlkali').map((taken): Slip => (
    { code: 'other-titrant-molar-mass', topic: 'strength', params: { taken }, options: { titrantAlkali: taken } }
  )),
  ...(figure.option('titrantKnownFrom') === 'label' ? [] : [{ code: 'label-strength', topic: 'strength', options: { titrantKnownFrom: 'label' } } as const]),
  { code: 'titrant-assay-left-out', topic: 'strength', replaced: { titrantWeighedAssay: (normal) => normal.times(0).plus(100) } },
  ...figure.others('referenceAcid').map((taken): Slip => (
    { code: 'other-reference-acid', topic: 'acid', params: { taken }, options: { referenceAcid: taken } }
  )),
  { code: 'exact-molar-mass', topic: 'acid', replaced: { referenceAcidMolarMass: to('acidMolarMass') } },
];
