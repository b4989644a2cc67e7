import { openBook } from '../../book/book.js';
import type { Book } from '../../book/book.js';
import { browserStore } from '../../book/browser-store.js';
import type { BookRefused } from '../../book/refusal.js';
import type { StateOf } from '../../book/summary.js';

/** A book in use, and what gives it back. */
export interface BookLoan {
  readonly book: Promise<Book | BookRefused>;
  readonly giveBack: () => void;
}

/** Books that elements of this page have open, one of each name. */
const open = new Map<string, { readonly book: Promise<Book | BookRefused>; users: number }>();

/** Opens the book of a name, or joins those who have it open; the last to give it back closes it. */
export function borrowBook(name: string, stateOf: StateOf): BookLoan {
  const shared = open.get(name) ?? { book: openBook(name, { store: browserStore, stateOf }), users: 0 };
  open.set(name, shared);
  shared.users += 1;
  let given = false;
  const leave = (): void => {
    shared.users -= 1;
    if (shared.users || open.get(name) !== shared) return;
    open.delete(name);
    void shared.book.then((book) => ('refused' in book ? undefined : book.close()));
  };
  // one that did not open is opened anew next time
  void shared.book.then((book) => {
    if ('refused' in book && open.get(name) === shared) open.delete(name);
  });
  return {
    book: shared.book,
    giveBack: () => {
      if (given) return;
      given = true;
      // an element that is only moved takes it again at once
      queueMicrotask(leave);
    },
  };
}
