import { ContextProvider } from '@lit/context';
import type { ReactiveControllerHost } from 'lit';
import type { UnitSystem } from '../../exchange/amount.js';
import { applyEdit, applySiteEdit } from '../../lot/edit.js';
import type { Edit } from '../../lot/edit.js';
import { EMPTY_LOT } from '../../lot/entry.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import { EMPTY_DESK, deskContext, deskOf } from './desk.js';
import type { Desk } from './desk.js';
import { EsterwayChangeEvent, EsterwayEditEvent, EsterwaySiteChangeEvent, EsterwayUndoEvent } from './events.js';

/** Steps back that are kept; each is a small document. */
const MOST_STEPS = 200;

/** Holds a lot for an element and all below it: takes their edits, reads the lot anew, hands it down. */
export class DeskHolder {
  readonly #host: ReactiveControllerHost & HTMLElement;
  readonly #provider: ContextProvider<typeof deskContext>;
  #desk: Desk = EMPTY_DESK;
  #outer: Desk | undefined;
  /** What the page set last. */
  #initial: LotEntry = EMPTY_LOT;
  #past: LotEntry[] = [];
  /** Which field the last edit was of: typing on in one field is one step back. */
  #lastField = '';

  constructor(host: ReactiveControllerHost & HTMLElement) {
    this.#host = host;
    this.#provider = new ContextProvider(host, { context: deskContext, initialValue: this.#desk });
    host.addEventListener(EsterwayEditEvent.type, this.#onEdit);
    host.addEventListener(EsterwayUndoEvent.type, this.#onUndo);
  }

  /** Steps back behind a holder further out: hands its lot down and lets edits pass. Undefined ends it. */
  follow(outer: Desk | undefined): void {
    this.#outer = outer;
    this.#provider.setValue(outer ?? this.#desk);
  }

  get desk(): Desk {
    return this.#desk;
  }

  /** Sets the lot from the page's side: no change event, and steps back begin anew. */
  setEntry(entry: LotEntry): void {
    this.#initial = entry;
    this.#past = [];
    this.#lastField = '';
    this.#put(deskOf(entry, this.#desk.site, this.#desk.units));
  }

  setSite(site: SiteProfile): void {
    this.#put(deskOf(this.#desk.entry, site, this.#desk.units, this.#desk.canUndo));
  }

  setUnits(units: UnitSystem): void {
    this.#put({ ...this.#desk, units });
  }

  /** Takes a person's edit. */
  edit(edit: Edit): void {
    const field = fieldOfEdit(edit);
    if (field === '' || field !== this.#lastField) {
      this.#past.push(this.#desk.entry);
      if (this.#past.length > MOST_STEPS) this.#past.shift();
    }
    this.#lastField = field;
    this.#change(applyEdit(this.#desk.entry, edit));
  }

  /** Goes back to the lot that the page set; can be taken back. */
  reset(): void {
    this.edit({ kind: 'replace', entry: this.#initial });
  }

  /** Takes the last step back. */
  undo(): void {
    const before = this.#past.pop();
    this.#lastField = '';
    if (before) this.#change(before);
  }

  #change(entry: LotEntry): void {
    this.#put(deskOf(entry, this.#desk.site, this.#desk.units, this.#past.length > 0));
    this.#host.dispatchEvent(new EsterwayChangeEvent(entry, this.#desk.reading));
  }

  #put(desk: Desk): void {
    this.#desk = desk;
    this.#provider.setValue(this.#outer ?? desk);
    this.#host.requestUpdate();
  }

  readonly #onUndo = (event: EsterwayUndoEvent): void => {
    if (this.#outer) return;
    event.stopPropagation();
    this.undo();
  };

  readonly #onEdit = (event: EsterwayEditEvent): void => {
    if (this.#outer) return;
    event.stopPropagation();
    if (!event.ofSite) return this.edit(event.edit);
    if (event.edit.kind === 'replace') return;
    const site = applySiteEdit(this.#desk.site, event.edit);
    this.setSite(site);
    this.#host.dispatchEvent(new EsterwaySiteChangeEvent(site));
  };
}

function fieldOfEdit(edit: Edit): string {
  switch (edit.kind) {
    case 'figure':
    case 'text':
      return edit.key;
    case 'cells': {
      const [only, ...more] = edit.cells;
      return only && !more.length ? `${edit.list}.${only.index}.${only.cell}` : '';
    }
    default:
      return '';
  }
}
