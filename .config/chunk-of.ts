import type { Rolldown } from 'vite';

type Modules = Pick<Rolldown.ChunkingContext, 'getModuleInfo'>;

/**
 * Which chunk a module goes to: what the script file needs at once is `main`; what two late groups need beside that is `shared`, so
 * that no group holds a copy. All else is left to the bundler.
 *
 * @param entry the module that the script file begins with
 */
export function chunkOf(entry: string): (id: string, modules: Modules) => string | undefined {
  let places: Places | undefined;
  return (id, modules) => {
    places ??= placesIn(entry, modules);
    return places.main.has(id) ? 'main' : places.shared.has(id) ? 'shared' : undefined;
  };
}

interface Places {
  readonly main: ReadonlySet<string>;
  readonly shared: ReadonlySet<string>;
}

function placesIn(entry: string, modules: Modules): Places {
  const inMain = reached(entry, modules);
  const late = new Set([...inMain].flatMap((id) => modules.getModuleInfo(id)?.dynamicallyImportedIds ?? []));
  const counts = new Map<string, number>();
  for (const start of late) for (const id of reached(start, modules)) if (!inMain.has(id)) counts.set(id, (counts.get(id) ?? 0) + 1);
  return { main: inMain, shared: new Set([...counts].flatMap(([id, count]) => (count > 1 ? [id] : []))) };
}

/** All modules that one imports at once, directly or not, itself among them. */
function reached(start: string, modules: Modules): ReadonlySet<string> {
  const found = new Set([start]);
  for (const id of found) for (const imported of modules.getModuleInfo(id)?.importedIds ?? []) found.add(imported);
  return found;
}
