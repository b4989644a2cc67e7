import type { LotReading, ReadingJson } from '../../lot/lot-reading.js';
import { readLot } from '../../lot/read-lot.js';
import { SiteSectionElement } from './site-section.js';

/** A section about figures that are not read for every lot: they are read when it is shown. */
export abstract class FurtherReadings extends SiteSectionElement {
  #of: unknown;
  #further: LotReading | undefined;

  /** Keys of the figures that it shows. */
  protected abstract get further(): readonly string[];

  protected override willUpdate(): void {
    const { entry, site, reading } = this.desk;
    if (reading === this.#of || this.folded) return;
    this.#of = reading;
    const read = super.lot && readLot(entry, site, { only: this.further });
    this.#further = read && !('faults' in read) ? read : undefined;
  }

  protected override get lot(): LotReading | undefined {
    const lot = super.lot;
    const more = this.#further;
    return lot && more ? { ...lot, readings: { ...more.readings, ...lot.readings }, problems: [...lot.problems, ...more.problems] } : lot;
  }

  protected override reading(key: string): ReadingJson | undefined {
    return super.reading(key) ?? this.#further?.readings[key];
  }
}
