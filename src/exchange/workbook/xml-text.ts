/** The longest text that a cell holds, in UTF-16 units. */
export const LONGEST_TEXT = 32_767;

/** What XML 1.0 has no way to write: controls, halves of pairs, U+FFFE and U+FFFF. */
const FORBIDDEN = /[\0-\x08\x0b\x0c\x0e-\x1f\ufffe\uffff]|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g;

/** In a cell `_x0041_` means the letter of that number (ECMA-376, ST_Xstring; from memory): a text that looks so is marked as text. */
const LOOKS_ESCAPED = /_(?=x[\da-fA-F]{4}_)/g;

const SIGNS: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', '\r': '&#13;' };

/** Text inside an element or an attribute; a character that no XML can hold becomes U+FFFD. */
export const xmlText = (text: string): string => text.replace(FORBIDDEN, '\ufffd').replace(/[&<>"\r]/g, (sign) => SIGNS[sign] ?? sign);

/** The text of a cell: as long as a cell may be, an ellipsis where it was longer. */
export function cellText(text: string): string {
  const short = text.length > LONGEST_TEXT ? `${text.slice(0, LONGEST_TEXT - 1)}…` : text;
  return xmlText(short.replace(LOOKS_ESCAPED, '_x005F_'));
}
