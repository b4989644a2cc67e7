import { Decimal } from '../../formula/decimal.js';
import { PASSES, ROUTES, each, nothing, per, to } from '../slips.js';
import type { Change, Changes, CheckedFigure, Slip } from '../slips.js';

const HUNDREDTH = new Decimal('0.01');
const assayTimes = (assay: string): Change => (normal, of) => normal.times(of(assay)).times(HUNDREDTH);
const assayPer = (assay: string): Change => (normal, of) => normal.div(of(assay).times(HUNDREDTH));
const twice = (change: Change): Change => (normal, of) => change(change(normal, of), of);
/** What is divided by the catalyst's assay. */
const PRODUCTS = ['baseProduct', 'extraProduct', 'mineralProduct', 'catalyst'];
const products = (change: Change): Changes => each(ROUTES, (route) => each(PRODUCTS, (name) => ({ [route + name]: change })));
const onRoutes = (name: string, change: Change): Changes => each(ROUTES, (route) => ({ [route + name]: change }));
/** The alkalis of the catalysts; their solutions have the same molar masses. */
const ALKALIS = ['KOH', 'NaOH', 'KOCH3', 'NaOCH3'];

/** Slips with the catalyst. */
export function catalystSlips(figure: CheckedFigure): readonly Slip[] {
  const others = ALKALIS.filter((alkali) => alkali !== figure.option('catalyst')?.replace('-solution', ''));
  const ofOther = (key: string, taken: string) => (): Decimal => figure.with([{ options: { catalyst: taken } }], key);
  return [
    { code: 'catalyst-assay-left-out', topic: 'assay', replaced: products(assayTimes('catalystAssay')) },
    { code: 'catalyst-assay-multiplied', topic: 'assay', replaced: products(twice(assayTimes('catalystAssay'))) },
    { code: 'catalyst-assay-twice', topic: 'assay', replaced: products(assayPer('catalystAssay')) },
    {
      code: 'extra-without-assay', topic: 'assay',
      replaced: each(ROUTES, (route) => ({ [`${route}catalyst`]: (_, of) => of(`${route}baseProduct`).plus(of(`${route}extraPure`)), [`${route}extraProduct`]: to(`${route}extraPure`) })),
    },
    ...others.map((taken): Slip => ({ code: 'other-catalyst-molar-mass', topic: 'catalyst', params: { taken }, replaced: { catalystMolarMass: ofOther('catalystMolarMass', taken) } })),
    ...others.map((taken): Slip => ({ code: 'other-base-load', topic: 'base', params: { taken }, replaced: { catalystBaseLoad: ofOther('catalystBaseLoad', taken) } })),
    { code: 'base-on-litres', topic: 'base', replaced: each(ROUTES, (route) => ({ [`${route}basePure`]: (normal, of) => normal.times(of('oilVolume')).div(of(`${route}feedMass`)) })) },
    { code: 'base-left-out', topic: 'base', replaced: onRoutes('basePure', nothing) },
    { code: 'extra-left-out', topic: 'extra', replaced: onRoutes('extraPure', nothing) },
    { code: 'mineral-left-out', topic: 'extra', replaced: onRoutes('mineralPure', nothing) },
    { code: 'mineral-counted-once', topic: 'extra', replaced: onRoutes('mineralPure', (normal) => normal.div(2)) },
  ];
}

/** Slips with methanol, of the base step and of the acid step. */
export const methanolSlips = (figure: CheckedFigure): readonly Slip[] => [
  { code: 'methanol-of-solution-left-out', topic: 'methanol', replaced: onRoutes('methanolFromCatalyst', nothing) },
  { code: 'methanol-assay-left-out', topic: 'methanol-assay', replaced: methanols(assayTimes('methanolAssay')) },
  { code: 'methanol-assay-multiplied', topic: 'methanol-assay', replaced: methanols(twice(assayTimes('methanolAssay'))) },
  {
    code: 'methanol-on-acid', topic: 'methanol',
    replaced: each(ROUTES, (route) => ({ [`${route}methanolNeeded`]: (normal, of) => normal.times(of(`${route}acid`)).div(of(`${route}glycerideAmount`)) })),
  },
  ...(/acid/.test(figure.option('pretreatmentMethanolBasis') ?? '')
    ? [{ code: 'methanol-on-oil', topic: 'methanol', replaced: each(PASSES, (pass) => ({ [`${pass}methanolPure`]: (normal, of) => normal.times(of('direct.glycerideAmount')).div(acidAt(pass, of)) })) } as const]
    : []),
  ...figure.others('pretreatmentMethanolBasis').map((basis): Slip => (
    { code: 'other-methanol-basis', topic: 'methanol', params: { basis }, options: { pretreatmentMethanolBasis: basis } }
  )),
];

const methanols = (change: Change): Changes => each([...ROUTES, ...PASSES], (step) => ({ [`${step}methanol`]: change }));

/** Free acid that a pass starts from, mol. */
const acidAt = (pass: string, of: (key: string) => Decimal): Decimal => of({ 'pass2.': 'pass1.acidLeft.slow', 'pass3.': 'pass2.acidLeft.slow' }[pass] ?? 'acidAmount');

/** Slips with the sulfuric acid of the acid step, and with what the acid step leaves. */
export const acidStepSlips = (figure: CheckedFigure): readonly Slip[] => [
  { code: 'sulfuric-assay-left-out', topic: 'sulfuric-assay', replaced: sulfurics(assayTimes('sulfuricAssay')) },
  { code: 'sulfuric-assay-multiplied', topic: 'sulfuric-assay', replaced: sulfurics(twice(assayTimes('sulfuricAssay'))) },
  ...(/acid/.test(figure.option('pretreatmentAcidBasis') ?? '')
    ? [{ code: 'sulfuric-on-oil', topic: 'sulfuric', replaced: each(PASSES, (pass) => ({ [`${pass}sulfuricPure`]: (normal, of) => normal.times(of('oilMass')).div(of(`${pass}acidMass`)) })) } as const]
    : []),
  ...figure.others('pretreatmentAcidBasis').map((basis): Slip => (
    { code: 'other-acid-basis', topic: 'sulfuric', params: { basis }, options: { pretreatmentAcidBasis: basis } }
  )),
  // the rule looks at nothing but the FFA: none of it asks for the rule of lean oil, all of it for that of rich oil
  ...['0', '100'].map((ffa): Slip => ({ code: 'rule-of-other-acidity', topic: 'rule', replaced: each(PASSES, (pass) => ({ [`${pass}ffaAtStart`]: () => new Decimal(ffa) })) })),
  { code: 'estimate-for-retest', topic: 'retest', options: { baseStepAcidFrom: 'estimate' } },
  { code: 'untreated-acid', topic: 'retest', replaced: { 'twoStep.acid': to('acidAmount') } },
  { code: 'untreated-mass', topic: 'oil', replaced: { 'pretreated.mass': to('oilMass') } },
];

const sulfurics = (change: Change): Changes => each(PASSES, (pass) => ({ [`${pass}sulfuric`]: change }));

/** An amount by weight, the same by volume, and the density between them. */
const BY_VOLUME = /^((?:direct|twoStep|pass\d)\.)(methanol|sulfuric|catalyst)(Volume)?$/;

/** Slips with the density of what is charged. */
export function densitySlips(figure: CheckedFigure): readonly Slip[] {
  const [, step, what = '', volume] = BY_VOLUME.exec(figure.key) ?? [];
  if (!step) return [];
  const density = what === 'catalyst' ? `${figure.option('catalyst')}.density` : `${what}Density`;
  if (!figure.run.sheet.quantities.has(density)) return [];
  const mass = step + what;
  const slip = (code: Slip['code'], change: Change): Slip => ({ code, topic: 'density', params: { density }, replaced: { [figure.key]: change } });
  return volume
    ? [slip('density-left-out', to(mass)), slip('density-multiplied', (_, of) => of(mass).times(of(density)))]
    : [slip('volume-for-mass', per(density))];
}

/** For the figures in mind: another quantity's value taken for this one's. */
export function mixedUpSlips({ key }: CheckedFigure): readonly Slip[] {
  const taken = (code: Slip['code'], from: string): Slip => ({ code, topic: 'result', replaced: { [key]: to(from) } });
  const [, route, name = ''] = /^(direct|twoStep)\.(.*)$/.exec(key) ?? [];
  const slips: Slip[] = [];
  if (route) slips.push(taken('other-route', `${route === 'direct' ? 'twoStep' : 'direct'}.${name}`));
  if (name === 'catalystPerLitre') slips.push(taken('per-litre-for-per-kilogram', `${route}.catalystPerKilogram`));
  if (name === 'catalystPerKilogram') slips.push(taken('per-litre-for-per-kilogram', `${route}.catalystPerLitre`));
  return slips;
}

