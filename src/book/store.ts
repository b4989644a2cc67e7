/** A document as the database holds it. */
export type StoredDocument = Readonly<Record<string, unknown>> & { readonly _id: string; readonly _rev?: string };

/** A document that came in, in the order of coming in. */
export interface StoredChange {
  readonly id: string;
  readonly seq: number | string;
  readonly deleted?: boolean;
  readonly doc?: StoredDocument;
}

interface Feed {
  on(event: 'change', listener: (change: StoredChange) => void): unknown;
  on(event: 'error', listener: (fault: unknown) => void): unknown;
  cancel(): void;
}

interface ChangesWanted {
  readonly since: number | string;
  readonly limit?: number;
  readonly include_docs: true;
}

interface DocumentsWanted {
  readonly include_docs: true;
  readonly startkey: string;
  readonly endkey: string;
  readonly limit?: number;
  readonly skip?: number;
}

/**
 * What the book asks of its database: a part of PouchDB's interface, which speaks the replication protocol of CouchDB.
 * Documents whose id begins with `_local/` are never copied to another book.
 */
export interface Store {
  put(document: StoredDocument): Promise<unknown>;
  /** Each by itself: one that is there already comes back with `status` 409, the others go in. */
  bulkDocs(documents: readonly StoredDocument[]): Promise<readonly { readonly id?: string; readonly status?: number }[]>;
  get(id: string): Promise<StoredDocument>;
  allDocs(wanted: DocumentsWanted): Promise<{ readonly rows: readonly { readonly id: string; readonly doc?: StoredDocument }[] }>;
  changes(wanted: ChangesWanted): PromiseLike<{ readonly results: readonly StoredChange[] }>;
  changes(wanted: ChangesWanted & { readonly live: true }): Feed;
  close(): Promise<void>;
}

const isStatus = (fault: unknown, status: number): boolean => (fault as { readonly status?: unknown } | undefined)?.status === status;
export const isMissing = (fault: unknown): boolean => isStatus(fault, 404);
export const isThereAlready = (fault: unknown): boolean => isStatus(fault, 409);
