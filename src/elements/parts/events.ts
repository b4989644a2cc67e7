import type { SiteProfile, LotEntry } from '../../lot/entry.js';
import type { Edit } from '../../lot/edit.js';
import type { LotFaults, LotReading } from '../../lot/lot-reading.js';

/** Asks the holder of the lot to change it. Internal: it goes no further than the holder. */
export class EsterwayEditEvent extends Event {
  static readonly type = 'esterway-edit';
  constructor(
    readonly edit: Edit,
    /** Whether the site profile is meant, not the lot. */
    readonly ofSite = false,
  ) {
    super(EsterwayEditEvent.type, { bubbles: true, composed: true });
  }
}

/** Asks the holder of the lot to take the last edit back. Internal, like {@link EsterwayEditEvent}. */
export class EsterwayUndoEvent extends Event {
  static readonly type = 'esterway-undo';
  constructor() {
    super(EsterwayUndoEvent.type, { bubbles: true, composed: true });
  }
}

/** A person changed the lot; it has been read anew. */
export class EsterwayChangeEvent extends Event {
  static readonly type = 'esterway-change';
  constructor(
    readonly entry: LotEntry,
    readonly reading: LotReading | LotFaults,
  ) {
    super(EsterwayChangeEvent.type, { bubbles: true, composed: true });
  }
}

/** A person changed a site value. The page may keep `site` and set it again next time. */
export class EsterwaySiteChangeEvent extends Event {
  static readonly type = 'esterway-site-change';
  constructor(readonly site: SiteProfile) {
    super(EsterwaySiteChangeEvent.type, { bubbles: true, composed: true });
  }
}

/** A person wants to see how a figure was worked out. */
export class EsterwayOpenEvent extends Event {
  static readonly type = 'esterway-open';
  constructor(
    /** Key of the quantity. */
    readonly key: string,
  ) {
    super(EsterwayOpenEvent.type, { bubbles: true, composed: true });
  }
}

declare global {
  interface HTMLElementEventMap {
    'esterway-edit': EsterwayEditEvent;
    'esterway-undo': EsterwayUndoEvent;
    'esterway-change': EsterwayChangeEvent;
    'esterway-site-change': EsterwaySiteChangeEvent;
    'esterway-open': EsterwayOpenEvent;
  }
}
