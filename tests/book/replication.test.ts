import { mkdtempSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express from 'express';
import serve from 'express-pouchdb';
import http from 'pouchdb-adapter-http';
import PouchDB from 'pouchdb-core';
import replication from 'pouchdb-replication';
import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Store } from '../../src/book/store.js';
import { EMPTY_SITE } from '../../src/core.js';
import { delivery, done, inMemory, keep, newName, open, textOf } from './books.js';

// Two benches share a book by a server that speaks CouchDB's replication protocol: outside code on both ends of the wire.

PouchDB.plugin(http).plugin(replication);
let address = '';
let close = (): void => undefined;

beforeAll(async () => {
  const app = express();
  app.use(serve(PouchDB.defaults({ adapter: 'memory' }), { mode: 'minimumForPouchDB', inMemoryConfig: true, logPath: join(mkdtempSync(join(tmpdir(), 'book-')), 'log.txt') }));
  const server = createServer(app);
  await new Promise<void>((listening) => server.listen(0, '127.0.0.1', listening));
  address = `http://127.0.0.1:${(server.address() as AddressInfo).port}/shared`;
  close = () => {
    server.closeAllConnections();
    server.close();
  };
});
afterAll(() => close());

it('two books copied into a server and back: both hold all versions of both, and nothing is in conflict', async () => {
  const [first, second] = [newName(), newName()];
  const [here, there] = [await open(first), await open(second)];
  const { record } = await keep(here, delivery('A', '1.2'));
  await inMemory(first).replicate.to(address);
  await inMemory(second).replicate.from(address);
  expect((await open(second)).find().lots.map(({ lot }) => lot)).toEqual([record.lot]);

  // both amend the same lot before they hear of each other, and each keeps a lot of its own
  const a = done(await here.amend(record.lot, delivery('A', '2'), EMPTY_SITE, { reason: 'here' })).record;
  const b = done(await there.amend(record.lot, delivery('A', '3'), EMPTY_SITE, { reason: 'there' })).record;
  await keep(here, delivery('B', '4'));
  await keep(there, delivery('C', '5'));
  for (const name of [first, second]) await inMemory(name).replicate.to(address);
  for (const name of [first, second]) await inMemory(name).replicate.from(address);

  const books = [await open(first), await open(second)];
  const all = await Promise.all(books.map(async (book) => (JSON.parse(await textOf(book)) as { records: unknown[] }).records));
  expect(all[0]).toHaveLength(5);
  expect(all[1]).toEqual(all[0]);
  for (const book of books) {
    expect(done(await book.versions(record.lot)).map(({ id }) => id).sort()).toEqual([record.id, a.id, b.id].sort());
    expect(book.size).toBe(3);
  }
  // both show the same version as the newest
  expect(books[1]!.find().lots).toEqual(books[0]!.find().lots);
  // the catalogue and the bench’s name are this book’s own
  await expect(new PouchDB<Store>(address).get('_local/bench')).rejects.toMatchObject({ status: 404 });
  // again: nothing is left to copy
  expect(await inMemory(first).replicate.to(address)).toMatchObject({ ok: true, docs_written: 0 });
});

it('a file restored on both benches is the same document on both', async () => {
  const [first, second, source] = [newName(), newName(), await open()];
  await keep(source, delivery('A', '1.2'));
  const text = await textOf(source);
  for (const name of [first, second]) expect(await (await open(name)).restore(text)).toEqual({ added: 1, already: 0, different: 0 });
  const revisions = await Promise.all([first, second].map(async (name) => (await inMemory(name).get(source.find().lots[0]!.id))._rev));
  expect(revisions[0]).toBe(revisions[1]);
});
