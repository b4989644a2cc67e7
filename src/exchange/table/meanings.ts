/** What a column of a sheet can hold: a text of the lot, a figure of it, or a cell of one of its runs. */
export type ColumnKey = TextKey | FigureKey | `run.${number}.${RunPart}`;
export const TEXT_KEYS = ['name', 'source', 'date'] as const;
export type TextKey = (typeof TEXT_KEYS)[number];
export const RUN_PARTS = ['sample', 'start', 'end', 'titre'] as const;
export type RunPart = (typeof RUN_PARTS)[number];

/** The figures that a column can hold, each with the unit that is meant where the heading has none. */
export const FIGURE_UNITS = {
  certificateFfa: '%', certificateAcidValue: 'mg/g', waterContent: '%', insolubles: '%', oilAmount: 'kg', oilTemperature: '°C', arrivalTemperature: '°C',
  titrantStrength: 'mol/L', blank: 'mL', titrationTemperature: '°C', saponificationValue: 'mg/g', iodineValue: '', 'retest.certificateFfa': '%', 'retest.certificateAcidValue': 'mg/g', oilPrice: '¤/t',
} as const;
export type FigureKey = keyof typeof FIGURE_UNITS;
export const RUN_UNITS: Readonly<Record<RunPart, string>> = { sample: 'g', start: 'mL', end: 'mL', titre: 'mL' };

export const isFigureKey = (key: string): key is FigureKey => Object.hasOwn(FIGURE_UNITS, key);
export const isTextKey = (key: string): key is TextKey => (TEXT_KEYS as readonly string[]).includes(key);

/** A cell of a run taken apart; runs count from 1. */
export function runColumn(key: string): { readonly run: number; readonly part: RunPart } | undefined {
  const [, run, part] = /^run\.([1-9]\d?)\.(sample|start|end|titre)$/.exec(key) ?? [];
  return run === undefined ? undefined : { run: Number(run), part: part as RunPart };
}

/** The unit that is meant where a heading has none. */
export const usualUnit = (key: ColumnKey): string => {
  const cell = runColumn(key);
  return cell ? RUN_UNITS[cell.part] : isFigureKey(key) ? FIGURE_UNITS[key] : '';
};

/** Headings as people write them, in English and German, evened out; the whole heading must be one of them. */
const NAMES: Readonly<Record<TextKey | FigureKey, readonly string[]>> = {
  name: ['lot', 'lot no', 'lot number', 'lot id', 'batch', 'batch no', 'batch number', 'delivery', 'delivery no', 'no', 'id', 'number', 'ticket', 'name', 'tank', 'partie', 'partie nr', 'charge', 'chargen nr', 'los', 'los nr', 'lieferung', 'lieferung nr', 'lieferschein', 'lieferscheinnummer', 'nr', 'nummer', 'bezeichnung'],
  source: ['source', 'supplier', 'collector', 'origin', 'from', 'customer', 'herkunft', 'lieferant', 'sammler', 'quelle', 'kunde', 'anlieferer'],
  date: ['date', 'day', 'delivered', 'delivered on', 'received', 'datum', 'tag', 'geliefert', 'geliefert am', 'eingang', 'eingangsdatum', 'lieferdatum'],
  certificateFfa: ['ffa', 'free fatty acid', 'free fatty acids', 'ffa content', 'freie fettsäuren', 'freie fettsäure', 'ffs'],
  certificateAcidValue: ['av', 'acid value', 'acid number', 'tan', 'sz', 'säurezahl', 'säurewert'],
  waterContent: ['water', 'moisture', 'water content', 'h2o', 'wasser', 'wassergehalt', 'feuchte', 'feuchtigkeit'],
  insolubles: ['insolubles', 'insoluble', 'impurities', 'dirt', 'solids', 'sediment', 'unlösliches', 'schmutz', 'verunreinigungen', 'feststoffe'],
  oilAmount: ['oil', 'amount', 'amount of oil', 'quantity', 'mass', 'net', 'net weight', 'net mass', 'weight', 'volume', 'öl', 'ölmenge', 'menge', 'masse', 'nettogewicht', 'netto', 'gewicht', 'volumen'],
  oilTemperature: ['oil temperature', 'öltemperatur'],
  arrivalTemperature: ['temperature', 'temp', 'temperature at arrival', 'arrival temperature', 'temperatur', 'temperatur bei ankunft', 'anliefertemperatur'],
  titrantStrength: ['titrant', 'titrant strength', 'strength', 'concentration', 'normality', 'molarity', 'koh', 'naoh', 'maßlösung', 'titer', 'konzentration', 'normalität'],
  blank: ['blank', 'blank titre', 'blank titer', 'blindwert'],
  titrationTemperature: ['titration temperature', 'room temperature', 'titrationstemperatur', 'raumtemperatur'],
  saponificationValue: ['sv', 'saponification value', 'saponification number', 'vz', 'verseifungszahl'],
  iodineValue: ['iv', 'iodine value', 'iodine number', 'iz', 'iodzahl', 'jodzahl'],
  'retest.certificateFfa': ['ffa after pretreatment', 'ffa of the retest', 'retest ffa', 'ffa after acid step', 'ffa nach vorbehandlung', 'ffa nach veresterung'],
  'retest.certificateAcidValue': ['acid value after pretreatment', 'retest acid value', 'av after pretreatment', 'säurezahl nach vorbehandlung', 'säurezahl nach veresterung'],
  oilPrice: ['price', 'oil price', 'preis', 'ölpreis'],
};

/** Headings of the cells of a run, with its number before or behind; without one it is the first. */
const RUN_NAMES: Readonly<Record<RunPart, readonly string[]>> = {
  sample: ['sample', 'portion', 'sample mass', 'sample weight', 'test portion', 'probe', 'einwaage', 'probenmenge'],
  start: ['start', 'initial', 'burette start', 'initial reading', 'anfang', 'anfangsstand', 'bürette anfang'],
  end: ['end', 'final', 'burette end', 'final reading', 'ende', 'endstand', 'bürette ende'],
  titre: ['titre', 'titration', 'consumption', 'titrant used', 'verbrauch', 'titration verbrauch'],
};

const BY_NAME = new Map(Object.entries(NAMES).flatMap(([key, names]) => names.map((name) => [name, key as ColumnKey] as const)));
const BY_RUN_NAME = new Map(Object.entries(RUN_NAMES).flatMap(([part, names]) => names.map((name) => [name, part as RunPart] as const)));

/** The meaning of a heading that has been evened out; undefined where none is known. */
export function meaningOf(name: string): ColumnKey | undefined {
  const known = BY_NAME.get(name);
  if (known) return known;
  const counted = /^(?:(?:run|bestimmung|titration)\s*(\d{1,2})\s*)?(.*?)\s*(\d{1,2})?$/.exec(name);
  const part = BY_RUN_NAME.get(counted?.[2] ?? '');
  const run = Number(counted?.[1] ?? counted?.[3] ?? 1);
  return part && run > 0 ? `run.${run}.${part}` : undefined;
}
