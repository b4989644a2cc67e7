/** What is used of PouchDB, which brings no types of its own. What a database offers is said where it is opened. */
declare module 'pouchdb-core' {
  interface Pouch {
    new <Database>(name: string, options?: { readonly adapter?: string }): Database;
    plugin(plugin: unknown): Pouch;
    defaults(options: { readonly adapter: string }): Pouch;
  }

  const PouchDB: Pouch;
  export default PouchDB;
}

declare module 'pouchdb-adapter-idb' {
  const plugin: unknown;
  export default plugin;
}

declare module 'pouchdb-adapter-memory' {
  const plugin: unknown;
  export default plugin;
}

declare module 'pouchdb-adapter-http' {
  const plugin: unknown;
  export default plugin;
}

declare module 'pouchdb-replication' {
  const plugin: unknown;
  export default plugin;
}

declare module 'express-pouchdb' {
  import type { RequestListener } from 'node:http';
  const server: (pouch: unknown, options: Readonly<Record<string, unknown>>) => RequestListener;
  export default server;
}
