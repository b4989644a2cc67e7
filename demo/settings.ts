// What a visitor chooses of the page; it stands in the address, so that a link opens the same view.

const CHOICES = {
  lang: ['en', 'de'],
  units: ['metric', 'us'],
  theme: ['system', 'light', 'dark'],
} as const;

type Choices = typeof CHOICES;
export type Settings = { readonly [Name in keyof Choices]: Choices[Name][number] };
export type Language = Settings['lang'];

/** From `?lang=de&units=us&theme=dark`, or the same behind `#`; the first choice where it says nothing known. */
export function readSettings(): Settings {
  return chosenIn(addressParams());
}

/** From the form of the page. */
export function settingsIn(form: HTMLFormElement): Settings {
  return chosenIn(new FormData(form));
}

export const lotInAddress = (): string | null => addressParams().get('lot');

/** Keeps the choices in the address. */
export function keepSettings(settings: Settings, lot: string | undefined): void {
  const params = new URLSearchParams();
  for (const [name, value] of Object.entries(settings)) {
    if (value !== CHOICES[name as keyof Choices][0]) params.set(name, value);
  }
  if (lot !== undefined) params.set('lot', lot);
  const query = params.toString();
  history.replaceState(null, '', query ? `?${query}` : location.pathname);
}

/** What holds for the whole page: its language and its colours. */
export function applyToPage({ lang, theme }: Settings): void {
  document.documentElement.lang = lang;
  document.documentElement.dataset['theme'] = theme;
}

function addressParams(): URLSearchParams {
  return new URLSearchParams(`${location.search.slice(1)}&${location.hash.slice(1)}`);
}

function chosenIn(from: { get(name: string): unknown }): Settings {
  const pick = <Known extends string>(name: string, known: readonly [Known, ...Known[]]): Known =>
    known.find((choice) => choice === from.get(name)) ?? known[0];
  return { lang: pick('lang', CHOICES.lang), units: pick('units', CHOICES.units), theme: pick('theme', CHOICES.theme) };
}
