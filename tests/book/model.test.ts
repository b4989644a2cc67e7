import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { EMPTY_SITE } from '../../src/core.js';
import { figure } from '../lot/lot.js';
import type { Book } from '../../src/book/book.js';
import { clock, delivery, done, keep, newName, open, textOf } from './books.js';

/** Waits until a book has heard of everything, as it does by itself. */
async function caughtUp(book: Book, lots: readonly { readonly id: string; readonly ffa: readonly number[] }[]): Promise<void> {
  while (lots.some(({ id, ffa }) => book.newestOf(id)?.number !== ffa.length)) {
    await new Promise<void>((heard) => {
      const end = book.watch(() => {
        end();
        heard();
      });
    });
  }
}

describe('against a plain list', () => {
  it('a thousand random operations', async () => {
    const operation = fc.oneof(
      { weight: 3, arbitrary: fc.record({ do: fc.constant('keep' as const), name: fc.constantFrom('A', 'B', 'C'), ffa: fc.integer({ min: 1, max: 30 }), source: fc.constantFrom('S', 'T') }) },
      { weight: 3, arbitrary: fc.record({ do: fc.constant('amend' as const), which: fc.nat(), ffa: fc.integer({ min: 1, max: 30 }), at: fc.nat({ max: 1 }) }) },
      { weight: 3, arbitrary: fc.record({ do: fc.constant('find' as const), source: fc.constantFrom('S', 'T'), from: fc.integer({ min: 1, max: 30 }), to: fc.integer({ min: 1, max: 30 }), at: fc.nat({ max: 1 }) }) },
      { weight: 1, arbitrary: fc.record({ do: fc.constant('reopen' as const), at: fc.nat({ max: 1 }) }) },
      { weight: 3, arbitrary: fc.record({ do: fc.constant('restore' as const) }) },
    );
    await fc.assert(
      fc.asyncProperty(fc.array(operation, { minLength: 40, maxLength: 40 }), async (operations) => {
        const [name, now] = [newName(), clock()];
        const books = [await open(name, { now }), await open(name, { now })];
        const opened = new Set(books);
        const model: { id: string; ffa: number[]; source: string; name: string }[] = [];
        const entryOf = (of: { name: string; source: string }, ffa: number) => delivery(of.name, String(ffa), of.source);
        for (const step of operations) {
          if (step.do === 'keep') {
            await caughtUp(books[0]!, model);
            const same = model.find((lot) => lot.name === step.name && lot.source === step.source && lot.ffa.at(-1) === step.ffa);
            const { record, unchanged } = await keep(books[0]!, entryOf(step, step.ffa));
            expect(unchanged).toBe(same !== undefined);
            if (!unchanged) model.push({ ...step, id: record.lot, ffa: [step.ffa] });
          } else if (step.do === 'amend' && model.length) {
            const lot = model[step.which % model.length]!;
            const { unchanged, record } = done(await books[step.at]!.amend(lot.id, entryOf(lot, step.ffa), EMPTY_SITE, { reason: 'r' }));
            expect(unchanged).toBe(lot.ffa.at(-1) === step.ffa);
            if (!unchanged) lot.ffa.push(step.ffa);
            expect(record.number).toBe(lot.ffa.length);
          } else if (step.do === 'reopen') {
            books[step.at] = await open(name, { now });
            opened.add(books[step.at]!);
          } else if (step.do === 'restore') {
            expect(await books[0]!.restore(await textOf(books[0]!))).toEqual({ added: 0, already: model.flatMap(({ ffa }) => ffa).length, different: 0 });
          } else if (step.do === 'find') {
            const book = books[step.at]!;
            await caughtUp(book, model);
            const expected = model.filter((lot) => lot.source === step.source && lot.ffa.at(-1)! >= step.from && lot.ffa.at(-1)! <= step.to).map(({ id }) => id).reverse();
            expect(book.find({ source: step.source, ffaFrom: String(step.from), ffaTo: String(step.to) }).lots.map(({ lot }) => lot)).toEqual(expected);
          }
        }
        for (const { id, ffa } of model) {
          expect(done(await books[1]!.versions(id)).map(({ entry }) => entry.figures['certificateFfa'])).toEqual(ffa.map((text) => figure(`${text} %`)));
        }
        for (const book of opened) await book.close();
      }),
      { numRuns: 25 },
    );
  }, 120_000);
});
