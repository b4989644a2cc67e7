/** Whether two JSON documents say the same; the order of keys does not matter, and a part that is undefined is not there. */
export function sameJson(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null || Array.isArray(a) !== Array.isArray(b)) return false;
  const keys = (of: object): readonly string[] => Object.keys(of).filter((key) => (of as Readonly<Record<string, unknown>>)[key] !== undefined);
  const [first, second] = [keys(a), keys(b)];
  return first.length === second.length && first.every((key) => Object.hasOwn(b, key) && sameJson((a as Readonly<Record<string, unknown>>)[key], (b as Readonly<Record<string, unknown>>)[key]));
}
