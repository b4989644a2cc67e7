import { describe, expect, it } from 'vitest';
import { decideRoute } from '../../src/decision/route.js';
import type { Route, RouteBasis } from '../../src/decision/route.js';
import { Decimal } from '../../src/formula/decimal.js';
import { Missing, Refused } from '../../src/formula/reading.js';
import { certified, lot, read, run, site } from '../lot/lot.js';

const pct = (text: string): Decimal => new Decimal(text);

/** The default limits (common practice, and 3 % after Kombe et al. 2013), a dry oil, a site that can run both steps. */
const decide = (ffa: string, more: Partial<RouteBasis> = {}): Route =>
  decideRoute({
    ffa: pct(ffa), directLimit: pct('3.0'), pretreatmentLimit: pct('40'), water: pct('0.05'), waterLimitBase: pct('0.10'), waterLimitAcid: pct('0.50'),
    acidProofEquipment: true, ...more,
  });
const codes = ({ reasons }: Route) => reasons.map(({ code }) => code);

describe('the route by FFA', () => {
  it.each([
    ['0.01', 'direct'], ['2.99', 'direct'],
    ['3.0', 'direct'], // a limit is kept at equality
    ['3.0001', 'two-step'], ['20', 'two-step'], ['39.99', 'two-step'], ['40', 'two-step'],
    ['40.0001', 'outside'], ['100', 'outside'],
  ] as const)('%s %% is %s', (ffa, verdict) => {
    expect(decide(ffa).verdict).toBe(verdict);
    expect(decide(ffa).safe).toBeUndefined();
  });

  it('says why, with the figures', () => {
    expect(decide('2.28').reasons).toEqual([{ code: 'at-or-below-direct-limit', params: { ffa: '2.28', limit: '3' } }]);
    expect(decide('12').reasons).toEqual([{ code: 'above-direct-limit', params: { ffa: '12', limit: '3' } }]);
    expect(decide('55').reasons).toEqual([{ code: 'above-pretreatment-limit', params: { ffa: '55', limit: '40' } }]);
  });

  // published limits below which no correction is needed: AV < 1, about 0.5 % (Wright 1944, Freedman 1984: found)
  it('calls the extra catalyst negligible at or below 0.5 %', () => {
    expect(codes(decide('0.5'))).toEqual(['at-or-below-direct-limit', 'extra-negligible']);
    expect(codes(decide('0.51'))).toEqual(['at-or-below-direct-limit']);
  });

  it('goes by the limits of the site', () => {
    expect(decide('1.5', { directLimit: pct('1') }).verdict).toBe('two-step');
    expect(decide('4.5', { directLimit: pct('5') }).verdict).toBe('direct');
    expect(decide('20', { pretreatmentLimit: pct('15') }).verdict).toBe('outside');
  });
});

describe('the guard band', () => {
  // one-sided 95 %: g = 1.645 u (Eurachem, compliance assessment, Annex A; from memory). A limit of 2.0 with u 0.10 accepts up
  // to 1.8355, with u 0.05 up to 1.91775 (derived).
  const near = (ffa: string, u: string) => decide(ffa, { directLimit: pct('2.0'), u: pct(u) });

  it.each([
    ['1.8355', '0.10', 'direct'], ['1.8356', '0.10', 'too-close'], ['2.0', '0.10', 'too-close'], ['2.1645', '0.10', 'too-close'], ['2.1646', '0.10', 'two-step'],
    ['1.91775', '0.05', 'direct'], ['1.91776', '0.05', 'too-close'],
  ] as const)('%s %% with u = %s is %s', (ffa, u, verdict) => {
    expect(near(ffa, u).verdict).toBe(verdict);
  });

  it('names the route that is safe on either side', () => {
    expect(near('1.95', '0.10')).toEqual({
      verdict: 'too-close', safe: 'two-step', odds: { limit: '2', below: '0.6915' }, reasons: [{ code: 'within-guard-band', params: { ffa: '1.95', limit: '2', guard: '0.1645' } }],
    });
    expect(decide('40', { u: pct('0.5') })).toMatchObject({ verdict: 'too-close', safe: 'outside' });
    expect(decide('3', { u: pct('0.5'), acidProofEquipment: false })).toMatchObject({ verdict: 'too-close', safe: 'no-acid-step' });
  });

  it('has no width while the uncertainty is not known', () => {
    expect(decide('3.0').verdict).toBe('direct');
  });
});

describe('water, a gate of its own', () => {
  it.each([
    ['2', '0.10', []], // at the limit
    ['2', '0.11', ['dry-before-base-step']],
    ['20', '0.50', []],
    ['20', '0.11', []], // the acid step bears more
    ['20', '0.51', ['dry-before-acid-step']],
    ['60', '5', []], // neither route is taken
  ] as const)('FFA %s %%, water %s %%: %j', (ffa, water, expected) => {
    expect(codes(decide(ffa, { water: pct(water) })).filter((code) => code.startsWith('dry'))).toEqual(expected);
  });

  it('tells the figures, and changes no verdict', () => {
    const wet = decide('2', { water: pct('0.3') });
    expect(wet.verdict).toBe('direct');
    expect(wet.reasons.at(-1)).toEqual({ code: 'dry-before-base-step', params: { water: '0.3', limit: '0.1' } });
  });

  it('stands before the safe route in a close call', () => {
    expect(codes(decide('3', { u: pct('0.5'), water: pct('0.6') }))).toContain('dry-before-acid-step');
    expect(codes(decide('3', { u: pct('0.5'), water: pct('0.2') }))).not.toContain('dry-before-base-step');
  });

  it('says when nobody measured it', () => {
    expect(codes(decide('2', { water: undefined }))).toContain('water-not-measured');
  });

  it('is silent where the figure was refused: the field says that', () => {
    expect(codes(decide('2', { water: new Refused({ code: 'negative', quantity: 'waterContent' }) }))).toEqual(['at-or-below-direct-limit']);
  });
});

describe('a site without acid-proof equipment', () => {
  it('has no two-step route', () => {
    const route = decide('12', { acidProofEquipment: false });
    expect(route.verdict).toBe('no-acid-step');
    expect(codes(route)).toEqual(['above-direct-limit', 'no-acid-proof-equipment']);
  });

  it('still takes the direct route, and declines what is outside both', () => {
    expect(decide('2', { acidProofEquipment: false }).verdict).toBe('direct');
    expect(decide('50', { acidProofEquipment: false }).verdict).toBe('outside');
  });
});

describe('what is not known', () => {
  it.each([
    ['FFA', { ffa: new Missing(['titrantStrength']) }],
    ['the direct limit', { directLimit: new Refused({ code: 'negative', quantity: 'directLimit' }) }],
    ['the pretreatment limit', { pretreatmentLimit: new Missing(['pretreatmentLimit']) }],
  ])('%s leaves the route open', (_, more) => {
    expect(decide('2', more)).toEqual({ verdict: 'not-known', reasons: [{ code: 'ffa-not-known', params: {} }] });
  });
});

/** A certificate that leaves nothing in doubt, down to the last of 34 digits. */
const CERTAIN = { certificateTolerance: `0.${'0'.repeat(60)}1 %` };

describe('the route of a lot', () => {
  // by way of acid content 3.0 % comes back as 3.000…001 %, which is no reason to send a lot through the acid step
  it.each(Array.from({ length: 80 }, (_, i) => ((i + 1) / 4).toFixed(2)))('a certificate of %s %% without doubt keeps a limit of as much', (ffa) => {
    expect(read(certified(ffa), site({ figures: { directLimit: `${ffa} %`, ...CERTAIN } })).route.verdict).toBe('direct');
  });

  it('keeps the default limit at a certificate of 3.0 % without doubt, and not at 3.01 %', () => {
    expect(read(certified('3.0'), site({ figures: CERTAIN })).route.verdict).toBe('direct');
    expect(read(certified('3.01'), site({ figures: CERTAIN })).route.verdict).toBe('two-step');
  });

  // 28.2 g and 0.1 mol/L: mL / 10 is % FFA, on the scale of AOCS Ca 5a-40
  it('keeps a limit at a titre that is exactly as much', () => {
    for (const millilitres of ['3.00', '3.70', '5.90', '30.00']) {
      const entry = lot({ figures: { titrantStrength: '0.1 mol/L' }, runs: [run('28.2 g', '0.00', millilitres)] });
      const { route, readings } = read(entry, site({ figures: { directLimit: `${Number(millilitres) / 10} %` } }));
      expect(route).toMatchObject({ verdict: 'too-close', odds: { below: '0.5000' } });
      expect(new Decimal(readings['freeFattyAcid']!.value!).toFixed(25)).toBe(new Decimal(millilitres).div(10).toFixed(25));
    }
  });

  it('is decided on water only where it was measured', () => {
    expect(codes(read(certified('2')).route)).toContain('water-not-measured');
    expect(codes(read(certified('2', { figures: { waterContent: '0.10 %' } })).route)).toEqual(['at-or-below-direct-limit']);
    expect(codes(read(certified('2', { figures: { waterContent: '1100 mg/kg' } })).route)).toEqual(['at-or-below-direct-limit', 'dry-before-base-step']);
  });

  it('knows the equipment of the site', () => {
    expect(read(certified('12'), site({ options: { acidProofEquipment: 'no' } })).route.verdict).toBe('no-acid-step');
  });

  it('shows both routes whatever the verdict', () => {
    for (const ffa of ['1', '12', '50']) {
      const { readings, charges } = read(certified(ffa));
      expect(charges.direct).toHaveLength(1);
      expect(charges.twoStep.at(-1)?.step).toBe('base');
      expect(readings['direct.catalyst']?.value).toBeDefined();
      expect(readings['twoStep.catalyst']?.value).toBeDefined();
    }
  });
});
