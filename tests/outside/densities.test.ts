import { describe, expect, it } from 'vitest';
import { DEFAULT_FIGURES } from '../../src/core.js';
import { certified, numberIn, read, site } from '../lot/lot.js';

describe('methanol', () => {
  // Density at 0, 15, 20, 25, 40 °C, g/mL (from memory). The line through 0.7913 at 20 °C with −0.00094 g/(mL·°C), from
  // memory too, meets them to 0.0001, half a digit more than they are printed to.
  it.each([['0', 0.81], ['15', 0.796], ['20', 0.7913], ['25', 0.7866], ['40', 0.7724]] as const)('at %s °C: %d g/mL', (celsius, density) => {
    const found = numberIn(read(certified('2', { figures: { methanolTemperature: `${celsius} °C` } })), 'methanolDensity');
    expect(Math.abs(found - density)).toBeLessThanOrEqual(0.0001 + 1e-12);
  });

  // 0.753 g/mL at 60 °C (from memory, less certain): the line gives 0.7537; methanol is never measured out that hot
  it('at 60 °C: within 0.001 of 0.753 g/mL', () => {
    expect(numberIn(read(certified('2', { figures: { methanolTemperature: '60 °C' } })), 'methanolDensity')).toBeCloseTo(0.753, 2);
  });

  it('is measured out by the density at its temperature', () => {
    const reading = read(certified('2', { figures: { methanolTemperature: '5 °C' } }));
    expect(numberIn(reading, 'direct.methanol') / numberIn(reading, 'direct.methanolVolume')).toBeCloseTo(0.8054, 12); // 0.7913 + 15 · 0.00094
  });
});

describe('oil', () => {
  // Lund's equation, sg 15/15 = 0.8475 + 0.00030 SV + 0.00014 IV (JAOCS 76 (1999) 1415, found).
  // Examples (derived): soybean SV 191 IV 130, 0.923; palm SV 199 IV 53, 0.915; water at 15 °C is 999.1 kg/m³ (from memory)
  it.each([['soybean', '191', '130', 0.923], ['palm', '199', '53', 0.915]] as const)('by Lund, %s: SV %s, IV %s', (_, sv, iv, gravity) => {
    const reading = read(certified('1', { figures: { saponificationValue: `${sv} mg/g`, iodineValue: iv }, options: { oilDensityBy: 'lund' } }));
    expect(numberIn(reading, 'oilDensity15') / 999.1).toBeCloseTo(gravity, 3);
  });

  // −0.00064 g/cm³ per °C, linear (JAOCS 76 (1999) 1415, citing Noureddini 1992, found)
  it.each(['-5', '15', '40', '75'])('loses 0.64 kg/m³ a degree: %s °C', (celsius) => {
    const reading = read(certified('1', { figures: { oilTemperature: `${celsius} °C`, measuredOilDensity: '921.5 kg/m³' }, options: { oilDensityBy: 'measured' } }));
    expect(numberIn(reading, 'oilDensity')).toBeCloseTo(921.5 - 0.64 * (Number(celsius) - 15), 10);
  });

  // Used cooking oil: 0.91 to 0.93 g/mL at 15 to 20 °C, about 0.885 to 0.895 at 60 °C (from memory)
  it.each([['15', 910, 930], ['20', 910, 930], ['60', 885, 895]] as const)('used oil at %s °C: %d to %d kg/m³', (celsius, least, most) => {
    const density = numberIn(read(certified('1', { figures: { oilTemperature: `${celsius} °C` } })), 'oilDensity');
    expect(density).toBeGreaterThanOrEqual(least);
    expect(density).toBeLessThanOrEqual(most);
  });

  // a portion by volume is weighed at the bench, at 15 to 20 °C as well
  it('has the same density by default where a portion is measured by volume', () => {
    expect(Number(DEFAULT_FIGURES['sampleDensity'] && DEFAULT_FIGURES['sampleDensity'].text) * 1000).toBeCloseTo(numberIn(read(certified('1')), 'oilDensity'), 0);
  });
});

describe('sulfuric acid', () => {
  // 96 % at 20 °C: 1.8355 g/mL; 93, 95, 98, 100 %: 1.8279, 1.8337, 1.8361, 1.8305 (Perry, CRC; from memory)
  it('is 1.8355 g/mL at 96 % by default', () => {
    expect([DEFAULT_FIGURES['sulfuricAssay']?.text, DEFAULT_FIGURES['sulfuricDensity']?.text]).toEqual(['96', '1.8355']);
  });

  it.each([['93', '1.8279'], ['95', '1.8337'], ['98', '1.8361'], ['100', '1.8305']])('of %s %% is measured out by its density', (assay, density) => {
    const reading = read(certified('20'), site({ figures: { sulfuricAssay: `${assay} %`, sulfuricDensity: `${density} g/mL` } }));
    expect(reading.problems).toEqual([]);
    expect(numberIn(reading, 'pass1.sulfuric') / numberIn(reading, 'pass1.sulfuricVolume')).toBeCloseTo(Number(density), 12);
  });
});

describe('methoxide solutions', () => {
  // NaOCH3 30 % in methanol 0.97 g/mL at 20 °C (from memory); KOCH3 32 % about 0.98 to 1.0 (from memory, uncertain)
  it.each([['NaOCH3-solution', '30', 0.97, 0.97], ['KOCH3-solution', '32', 0.98, 1]] as const)('%s: %s %%, %d to %d g/mL', (product, assay, least, most) => {
    expect(DEFAULT_FIGURES[`${product}.assay`]?.text).toBe(assay);
    const reading = read(certified('2', { options: { catalyst: product } }));
    const density = numberIn(reading, 'direct.catalyst') / numberIn(reading, 'direct.catalystVolume');
    expect(density).toBeGreaterThanOrEqual(least - 1e-9);
    expect(density).toBeLessThanOrEqual(most + 1e-9);
  });

  // 1 kg of 30 % solution brings 0.70 kg methanol (derived), which the methanol to weigh is less by
  it('bring methanol that is credited', () => {
    const reading = read(certified('2', { options: { catalyst: 'NaOCH3-solution' } }), site({ figures: { methanolAssay: '100 %' } }));
    expect(numberIn(reading, 'direct.methanolFromCatalyst') / numberIn(reading, 'direct.catalyst')).toBeCloseTo(0.7, 12);
    expect(numberIn(reading, 'direct.methanolNeeded') - numberIn(reading, 'direct.methanol')).toBeCloseTo(numberIn(reading, 'direct.methanolFromCatalyst'), 10);
  });
});
