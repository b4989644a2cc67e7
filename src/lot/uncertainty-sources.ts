import { runKey } from '../chemistry/lot-formulas.js';
import type { LotRuns, RunPlan, RunPrefix } from '../chemistry/lot-formulas.js';
import type { UncertaintySource } from '../formula/uncertainty-source.js';

/**
 * What leaves the results of a lot in doubt. The balance and the burette err alike in every run that
 * is made with them; how far an end point is overshot is a new matter each time. What a site sets for
 * itself (methanol ratio, base load, limits) is no measurement and carries none.
 */
export function uncertaintySources({ lot, retest, titrant }: LotRuns): readonly UncertaintySource[] {
  const each = (prefix: RunPrefix, { counted }: RunPlan, name: string): string[] => counted.map((index) => runKey(prefix, index, name));
  const oil = (name: string): string[] => [...each('', lot, name), ...each('retest.', retest, name)];
  const normal = (key: string, ...at: readonly string[]): UncertaintySource => ({ key, shape: 'normal', at });
  const flat = (key: string, ...at: readonly string[]): UncertaintySource => ({ key, shape: 'rectangular', at });
  const peaked = (key: string, ...at: readonly string[]): UncertaintySource => ({ key, shape: 'triangular', at });
  // what a run tells by itself scatters more than what is made of them all; nothing rests on it
  const alone = (prefix: '' | 'retest.', { runs }: RunPlan): UncertaintySource[] => [
    normal(`${prefix}u.meanAcidValue`, `${prefix}meanAcidValue`),
    ...Array.from({ length: runs }, (_, index) => [
      normal(`${prefix}u.runAcidValue`, runKey(prefix, index, 'acidValue')), normal(`${prefix}u.runFreeFattyAcid`, runKey(prefix, index, 'freeFattyAcid')),
    ]).flat(),
  ];
  const standards = (name: string): string[] => each('titrant.', titrant, name);
  return [
    normal('u.repeatability', 'titratedAcidContent'),
    normal('retest.u.repeatability', 'retest.titratedAcidContent'),
    ...alone('', lot), ...alone('retest.', retest),
    ...oil('titre').map((at) => flat('u.endPoint', at)),
    flat('u.blankEndPoint', 'blank'),
    peaked('u.burette', ...oil('titre')),
    flat('u.balance', ...oil('weighedMass')),
    peaked('u.sampleVolume', ...oil('sampleVolume')),
    flat('u.sampleDensity', 'sampleDensity'),
    normal('u.temperature', 'volumeFactor'),
    flat('u.titrant', 'titrantConcentration'),
    ...standards('titre').map((at) => flat('u.khpEndPoint', at)),
    flat('u.khpBlankEndPoint', 'khpBlank'),
    peaked('u.khpBurette', ...standards('titre')),
    flat('u.khpBalance', ...standards('portion')),
    flat('u.khpPurity', 'khpPurity'),
    normal('u.khpMolarMass', 'khpMolarMass'),
    normal('u.khpTemperature', ...standards('titre')),
    ...standards('concentration').map((at) => normal('u.khpRepeatability', at)),
    flat('u.certificate', 'acidContent'),
    flat('retest.u.certificate', 'retest.acidContent'),
    flat('u.oilMass', 'weighedOil'),
    flat('u.oilVolume', 'oilVolumeGiven'),
    flat('u.catalystAssay', 'catalystAssay'),
    flat('u.sulfuricAssay', 'sulfuricAssay'),
    flat('u.saponification', 'saponificationValue'),
  ];
}
