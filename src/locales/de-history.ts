import type { Widened } from './en.js';
import type { enHistory } from './en-history.js';

/** Die Partien einer Herkunft im Lauf der Zeit. */
export const deHistory: Widened<typeof enHistory> = {
  title: 'Verlauf von {source}',
  noSource: 'ohne Herkunft',
  empty: 'Von dieser Herkunft steht noch keine Partie im Buch.',
  figure: 'Zeigen',
  figures: { freeFattyAcid: 'freie Fettsäuren', acidValue: 'Säurezahl', water: 'Wasser' },
  units: { freeFattyAcid: '%', acidValue: 'mg/g', water: '%' },
  one: 'Eine Partie: {value} {unit} am {date}.',
  few: 'Bisher {lots} Partien; Grenzen werden ab {fewest} Partien gezogen.',
  centre: 'Mittel von {lots} Partien {centre} {unit}; eine Partie zwischen {lower} und {upper} {unit} ist für diese Herkunft üblich.',
  plot: 'Einzelwerte: {lots} Partien, Mittel {centre}, Grenzen {lower} und {upper} {unit}.',
  plotFew: 'Einzelwerte: {lots} Partien.',
  rangePlot: 'Gleitende Spannweite: Mittel {mean}, obere Grenze {upper} {unit}.',
  range: 'gleitende Spannweite',
  steady: 'Keine Regel schlägt an: Die Herkunft ist stetig.',
  rules: {
    'beyond-limits': { up: '{to}: über der oberen Grenze.', down: '{to}: unter der unteren Grenze.' },
    'nine-on-one-side': { up: '{from} bis {to}: neun oder mehr Partien in Folge über dem Mittel. Die Herkunft hat sich verschoben.', down: '{from} bis {to}: neun oder mehr Partien in Folge unter dem Mittel. Die Herkunft hat sich verschoben.' },
    'six-in-a-row': { up: '{from} bis {to}: sechs oder mehr Partien, jede höher als die davor. Die Herkunft steigt.', down: '{from} bis {to}: sechs oder mehr Partien, jede niedriger als die davor. Die Herkunft fällt.' },
    'two-of-three': { up: '{from} bis {to}: zwei von drei Partien weit über dem Mittel.', down: '{from} bis {to}: zwei von drei Partien weit unter dem Mittel.' },
  },
  ask: 'Bei der Herkunft nachfragen, was sich geändert hat, und die nächsten Partien genauer ansehen.',
  without: '{lots} Partien haben dafür keinen Wert und bleiben außen vor.',
  undated: '{lots} Partien haben kein Datum und stehen am Ende.',
  method: 'Einzelwert- und Spannweitenkarte nach ISO 7870-2, Regeln nach Nelson 1984; beides aus dem Gedächtnis.',
  noDate: 'ohne Datum',
  table: 'Die Partien einzeln',
  heads: { date: 'Datum', lot: 'Partie', value: 'Wert', range: 'Spannweite' },
  expected: 'Von der nächsten Partie zu erwarten: Säurezahl {value} mg/g, das Mittel der letzten {lots} Partien.',
  plan: 'Titration mit {value} mg/g planen',
  planned: 'Die Titration ist mit {value} mg/g geplant.',
  out: 'Partien, bei denen eine Regel anschlägt',
};
