/** How the paper is to be called, and in which language it is. */
export interface Paper {
  readonly title: string;
  readonly lang: string;
}

/** White paper with a margin that every printer keeps; A4 and Letter alike. */
const PAGE = '@page{margin:12mm}html{color-scheme:light}body{margin:0;background:#fff}';

/**
 * Prints one element alone, whatever page it comes from: in a frame of its own that nobody sees and that
 * is taken away afterwards, so the page around it needs no rules for print. The element must be able to
 * stand in another document (`GuestElement` can).
 */
export async function printAlone(element: HTMLElement, { title, lang }: Paper): Promise<void> {
  const frame = document.createElement('iframe');
  frame.title = title;
  frame.tabIndex = -1;
  frame.setAttribute('aria-hidden', 'true');
  // set one by one: a page may forbid style attributes
  for (const [name, value] of [['position', 'fixed'], ['inset', '0 auto auto -1px'], ['width', '1px'], ['height', '1px'], ['border', '0'], ['opacity', '0']] as const) {
    frame.style.setProperty(name, value);
  }
  // some browsers put a new empty page in the frame after a while: what was written before would be lost
  const loaded = new Promise((done) => frame.addEventListener('load', done, { once: true }));
  document.body.append(frame);
  await loaded;
  const view = frame.contentWindow as (Window & typeof globalThis) | null;
  if (!view) throw new Error('this page allows no frame to print from');
  const paper = view.document;
  paper.documentElement.lang = lang;
  paper.title = title;
  const sheet = new view.CSSStyleSheet();
  sheet.replaceSync(PAGE);
  paper.adoptedStyleSheets = [sheet];
  paper.body.append(element);
  await (element as HTMLElement & { updateComplete?: Promise<unknown> }).updateComplete;
  view.addEventListener('afterprint', () => frame.remove(), { once: true });
  view.focus();
  view.print();
}
