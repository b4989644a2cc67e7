/** A person kept a lot in the book, or amended one there. */
export class EsterwayKeptEvent extends Event {
  static readonly type = 'esterway-kept';
  constructor(
    /** Of the lot, the same in all its versions. */
    readonly id: string,
    /** 1 for a lot kept for the first time. */
    readonly version: number,
  ) {
    super(EsterwayKeptEvent.type, { bubbles: true, composed: true });
  }
}

declare global {
  interface HTMLElementEventMap {
    'esterway-kept': EsterwayKeptEvent;
  }
}
