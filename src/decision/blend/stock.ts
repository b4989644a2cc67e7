import type { Decimal } from '../../formula/decimal.js';

/** What mixes by mass and can have a limit, as % of the blend's mass. */
export const SHARES = ['freeFattyAcid', 'water', 'insolubles'] as const;
export type Share = (typeof SHARES)[number];
export type Shares = Readonly<Partial<Record<Share, Decimal>>>;

/** How much is to be blended, against a mass that is named. */
export const MASS_RULES = ['at-least', 'exactly', 'at-most'] as const;
export type MassRule = (typeof MASS_RULES)[number];

/** What the blend is for: the cheapest that serves, or the one that takes up most oil above the limit of free fatty acid. */
export const GOALS = ['use-sour', 'least-cost'] as const;
export type Goal = (typeof GOALS)[number];

/** A lot or a tank in stock. */
export interface BlendItem {
  readonly name: string;
  /** kg there is. */
  readonly available: Decimal;
  /** kg that must go in. */
  readonly least: Decimal;
  /** %, as a certificate or a titration gives it; one that has a limit must be known. */
  readonly shares: Shares;
  /** Of one kg, in the site's own money; below zero where it is paid for being taken. */
  readonly cost?: Decimal;
}

export interface BlendTask {
  readonly items: readonly BlendItem[];
  /** Highest shares of the blend, %. */
  readonly limits: Shares;
  readonly mass?: { readonly rule: MassRule; readonly of: Decimal };
  readonly goal: Goal;
  /** kg that a pump or a scale is read to: parts are whole steps, or all there is of a lot. */
  readonly step: Decimal;
}

/** Whether oil is above the limit that the blend has to keep: what a blend is to take up. */
export const isSour = ({ shares }: BlendItem, limits: Shares): boolean =>
  !!shares.freeFattyAcid && !!limits.freeFattyAcid && shares.freeFattyAcid.gt(limits.freeFattyAcid);
