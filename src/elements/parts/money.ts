/** Texts that were written in a currency before, by the texts they were made from. */
const made = new WeakMap<object, { readonly currency: string; readonly texts: unknown }>();

/** A text, or all texts of a part, with the site's own money for the general sign `¤`. */
export function inMoney<T>(texts: T, currency: string | undefined): T {
  if (!currency) return texts;
  if (typeof texts !== 'object' || texts === null) return replaced(texts, currency) as T;
  const before = made.get(texts);
  if (before?.currency === currency) return before.texts as T;
  const now = replaced(texts, currency);
  made.set(texts, { currency, texts: now });
  return now as T;
}

function replaced(texts: unknown, currency: string): unknown {
  // a function, since a name of money may hold the signs of a replacement
  if (typeof texts === 'string') return texts.replaceAll('¤', () => currency);
  if (Array.isArray(texts)) return texts.map((text) => replaced(text, currency));
  if (typeof texts !== 'object' || texts === null) return texts;
  return Object.fromEntries(Object.entries(texts).map(([key, text]) => [key, replaced(text, currency)]));
}
