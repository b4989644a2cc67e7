import { nothing, to } from '../slips.js';
import type { CheckedFigure, Slip } from '../slips.js';

/** Slips with the oil of the batch. */
export const oilSlips = (figure: CheckedFigure): readonly Slip[] => [
  ...(figure.option('oilAmountBy') === 'volume'
    ? [{ code: 'litres-for-kilograms', topic: 'oil', replaced: { oilMass: to('oilVolumeGiven') } } as const]
    : [
        { code: 'kilograms-for-litres', topic: 'oil', options: { oilAmountBy: 'volume' }, replaced: { oilVolumeGiven: () => figure.value('oilMass') } } as const,
        { code: 'oil-density-left-out', topic: 'oil', replaced: { oilVolume: to('oilMass') } } as const,
      ]),
  { code: 'oil-temperature-left-out', topic: 'oil', replaced: { oilDensity: to('oilDensity15') } },
  { code: 'free-acid-not-deducted', topic: 'glycerides', replaced: { glycerideContent: () => figure.with([{ replaced: { acidContent: nothing } }], 'glycerideContent') } },
  { code: 'oil-water-left-out', topic: 'water', replaced: { waterContent: nothing } },
];
