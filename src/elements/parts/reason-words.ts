import type { Reason } from '../../decision/route.js';
import { showNumber } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { fill } from '../../locales/fill.js';
import type { Texts } from '../../locales/en.js';
import { sourceName } from '../../locales/quantity-name.js';
import type { ReadingJson } from '../../lot/lot-reading.js';

/** What is needed of the element that says why. */
export interface ReasonHost {
  texts(): Texts;
  tag(): string;
  reading(key: string): ReadingJson | undefined;
}

const LIMITS = ['directLimit', 'pretreatmentLimit', 'pretreatmentTarget', 'waterLimitBase', 'waterLimitAcid'];

/** Shares in a sentence: two decimals, or more where one would look equal to a limit that it misses. */
const SHARE_DIGITS = [{ bands: [{ below: '10', decimals: 2 }, { decimals: 1 }] }, { decimals: 2 }, { decimals: 3 }, { decimals: 4 }, { decimals: 6 }] as const;

/** The reasons of a route as sentences. */
export class ReasonWords {
  constructor(private readonly host: ReasonHost) {}

  sentence({ code, params }: Reason): string {
    const texts = this.host.texts();
    const words = (name: string, value: string): string | undefined => (name === 'passes' || name === 'runs' ? value : name === 'source' ? sourceName(value, texts) : undefined);
    const shown = Object.entries(params).map(([name, value]) => [name, words(name, value) ?? this.siteText(value) ?? this.share(value, params['limit'] ?? params['target'])] as const);
    const water = this.host.reading('waterContent')?.shown;
    return fill(texts.reasons[code], { ...(water !== undefined && { water: this.number(water) }), ...Object.fromEntries(shown) });
  }

  /** A limit as the site wrote it, else with the digits of a share. */
  limit(value: string): string {
    return this.siteText(value) ?? this.share(value, undefined);
  }

  private siteText(value: string): string | undefined {
    const key = LIMITS.find((limit) => this.host.reading(limit)?.value === value);
    const shown = key && this.host.reading(key)?.shown;
    return shown === undefined ? undefined : this.number(shown);
  }

  private share(value: string, limit: string | undefined): string {
    const exact = new Decimal(value);
    const texts = SHARE_DIGITS.map((digits) => shownText(exact, digits));
    const apart = texts.find((text) => limit === undefined || !new Decimal(text).eq(limit));
    return this.number(apart ?? texts[0] ?? value);
  }

  private number(text: string): string {
    return showNumber(text, this.host.tag());
  }
}
