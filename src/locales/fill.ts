/** Puts figures and words into a sentence. */
export function fill(text: string, params: Readonly<Record<string, string>>): string {
  // a figure keeps its per cent sign, its degree and its ± on the same line
  return text.replace(/\{(\w+)\}/g, (whole, name: string) => params[name] ?? whole).replace(/ (?=[%°])|(?<=±) /g, '\u00a0');
}

/** The same with parts of a page put in: the words between them, and the parts, in order. */
export function fillWith<Part>(text: string, parts: Readonly<Record<string, Part>>): readonly (string | Part)[] {
  return text.split(/\{(\w+)\}/).map((piece, i) => (i % 2 ? (parts[piece] ?? `{${piece}}`) : piece));
}
