import { ContextConsumer } from '@lit/context';
import { property } from 'lit/decorators.js';
import type { UnitSystem } from '../../exchange/amount.js';
import type { Edit } from '../../lot/edit.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import type { LotReading, ReadingJson } from '../../lot/lot-reading.js';
import type { Texts } from '../../locales/en.js';
import { EMPTY_DESK, deskContext } from './desk.js';
import type { Desk } from './desk.js';
import { DeskHolder } from './desk-holder.js';
import { EsterwayEditEvent } from './events.js';
import { GuestElement } from './guest.js';
import { LanguageController } from './language.js';
import { inMoney } from './money.js';

/** What a part says in each language; it comes with the part. */
export interface PartTexts<T> {
  readonly en: T;
  readonly de: T;
}

/**
 * An element that shows part of a lot. It takes the lot from the holder around it (a site or a
 * panel); standing alone, it holds one of its own.
 */
export abstract class LotElement extends GuestElement {
  readonly #language = new LanguageController(this);
  #own: DeskHolder | undefined;
  #outer: Desk | undefined;

  constructor() {
    super();
    new ContextConsumer(this, {
      context: deskContext,
      subscribe: true,
      callback: (desk) => {
        this.#outer = desk;
        this.#own?.follow(desk);
        this.requestUpdate();
      },
    });
  }

  /** The lot as typed. Setting it has an effect only where this element holds the lot itself. */
  @property({ attribute: false })
  set entry(entry: LotEntry) {
    this.holder.setEntry(entry);
  }
  get entry(): LotEntry {
    return this.desk.entry;
  }

  /** The site profile. Setting it has an effect only where this element holds the lot itself. */
  @property({ attribute: false })
  set site(site: SiteProfile) {
    this.holder.setSite(site);
  }
  get site(): SiteProfile {
    return this.desk.site;
  }

  /** Units in which amounts are shown: `metric` or `us`. Has an effect only where this element holds the lot itself. */
  @property()
  set units(units: UnitSystem) {
    this.holder.setUnits(units === 'us' ? 'us' : 'metric');
  }
  get units(): UnitSystem {
    return this.desk.units;
  }

  override connectedCallback(): void {
    this.#outer = undefined;
    super.connectedCallback();
    // a holder around it has answered by now, since asking is synchronous
    if (this.holdsLot) this.holder.follow(undefined);
    else this.#own?.follow(this.#outer);
  }

  /** Whether the lot is this element's own, for want of a holder around it. */
  protected get holdsLot(): boolean {
    return !this.#outer;
  }

  /** This element's own holder; it follows the one around it, if there is one. */
  protected get holder(): DeskHolder {
    return (this.#own ??= new DeskHolder(this));
  }

  protected get desk(): Desk {
    return this.#outer ?? this.#own?.desk ?? EMPTY_DESK;
  }

  protected get texts(): Texts {
    return this.#language.texts;
  }

  /** The texts of a part that is fetched by itself, in the page's language. */
  protected textsOf<T>(part: PartTexts<T>): T {
    return inMoney(part[this.languageTag.startsWith('de') ? 'de' : 'en'], this.desk.site.currency);
  }

  /** A unit or a sentence with the name of the site's money put in. */
  protected inMoney(text: string): string {
    return inMoney(text, this.desk.site.currency);
  }

  protected get languageTag(): string {
    return this.#language.tag;
  }

  /** What was read; undefined when the entry itself is no valid document. */
  protected get lot(): LotReading | undefined {
    const { reading } = this.desk;
    return 'faults' in reading ? undefined : reading;
  }

  protected reading(key: string): ReadingJson | undefined {
    const readings = this.lot?.readings;
    // a key such as `constructor` names nothing
    return readings && Object.hasOwn(readings, key) ? readings[key] : undefined;
  }

  protected edit(edit: Edit): void {
    this.dispatchEvent(new EsterwayEditEvent(edit));
  }
}
