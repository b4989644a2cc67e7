import { describe, expect, it } from 'vitest';
import { Missing } from '../../src/formula/reading.js';
import { found, outcome } from '../lot/found.js';
import { lot } from '../lot/lot.js';

// Soap and leftover catalyst by two indicators: Van Gerpen et al. 2004, NREL/SR-510-36240 (from memory). A mL of HCl of strength N to
// the end of phenolphthalein, B mL further to the end of bromophenol blue, W g of sample:
//   catalyst g/g = A · N · 40.0 (NaOH) or 56.1 (KOH) / (1000 · W); soap g/g = B · N · 304.4 (Na) or 320.56 (K) / (1000 · W)

const titrated = (catalyst: string, figures: Readonly<Record<string, string>>) => lot({
  figures: { soapSample: '10 g', soapTitrantStrength: '0.1 mol/L', phenolphthaleinTitre: '0.35 mL', bromophenolTitre: '1.90 mL', ...figures }, options: { catalyst },
});

describe('soap and catalyst by two indicators', () => {
  // 0.35 · 0.1 · 40.0 / 10 = 0.140 g/kg; 1.90 · 0.1 · 304.4 / 10 = 5.7836 g/kg; KOH 0.196, 6.0906 (by hand)
  it.each([
    ['NaOH', 0.14, 5.7836], ['KOH', 0.19635, 6.0906],
    // the same oleate from a methoxide, the catalyst as the methoxide charged: 0.35 · 0.1 · 54.02 / 10, 70.13
    ['NaOCH3', 0.18907, 5.7836], ['KOCH3-solution', 0.24546, 6.0906],
  ])('%s: %d g/kg of catalyst, %d g/kg of soap', (catalyst, free, soap) => {
    expect(found(titrated(catalyst, {}), 'after.catalystFound').toNumber()).toBeCloseTo(free, 4);
    expect(found(titrated(catalyst, {}), 'after.soapFound').toNumber()).toBeCloseTo(soap, 4);
  });

  // AOCS Cc 17-95 (from memory): soap, mg/kg as sodium oleate = (S − B) · N · 304.4 · 1000 / m, S and B titres of sample and blank.
  // Its portion is 40 g, its acid 0.01 M (found): 1.25 − 0.25 mL is 76.1 mg/kg
  it('on washed ester, without catalyst, is AOCS Cc 17-95', () => {
    const washed = titrated('NaOH', {
      soapSample: '40 g', soapTitrantStrength: '0.01 mol/L', phenolphthaleinTitre: '0 mL', bromophenolTitre: '1.25 mL', bromophenolBlank: '0.25 mL',
    });
    expect(found(washed, 'after.soapFound').times(1000).toString()).toBe('76.1');
    expect(found(washed, 'after.catalystFound').toString()).toBe('0');
  });

  // M sodium oleate 304.45, potassium oleate 320.56 (derived): the method's figures lie within 0.02 % of the substances
  it('counts soap as the oleates', () => {
    expect(found(titrated('NaOH', {}), 'soapMolarMass').toNumber() / 304.45).toBeCloseTo(1, 3);
    expect(found(titrated('KOH', {}), 'soapMolarMass').toNumber() / 320.56).toBeCloseTo(1, 5);
  });

  it('subtracts each blank, and refuses less than nothing at its titre', () => {
    expect(found(titrated('NaOH', { phenolphthaleinBlank: '0.05 mL' }), 'after.catalystTitre').toString()).toBe('0.3');
    expect(outcome(titrated('NaOH', { phenolphthaleinBlank: '0.36 mL' }), 'after.catalystFound')).toMatchObject({ problem: { code: 'titre-below-blank', quantity: 'phenolphthaleinTitre' } });
    expect(outcome(titrated('NaOH', { bromophenolBlank: '2 mL' }), 'after.soapFound')).toMatchObject({ problem: { code: 'titre-below-blank', quantity: 'bromophenolTitre' } });
  });

  it('needs portion, acid and both ends, and nothing of the lot itself', () => {
    expect(outcome(lot({}), 'after.soapFound')).toEqual(new Missing(['bromophenolTitre', 'soapTitrantStrength', 'soapSample']));
    expect(outcome(lot({}), 'after.catalystFound')).toEqual(new Missing(['phenolphthaleinTitre', 'soapTitrantStrength', 'soapSample']));
  });
});
