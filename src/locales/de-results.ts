import type { enResults } from './en-results.js';
import type { Widened } from './en.js';

/** Ergebnisse von Partien als Zeilen einer Tabelle. */
export const deResults: Widened<typeof enResults> = {
  heads: {
    name: 'Partie',
    source: 'Herkunft',
    date: 'Datum',
    site: 'Betrieb',
    acidValue: 'Säurezahl als KOH',
    acidValueExpanded: 'Säurezahl, ±',
    freeFattyAcid: 'Freie Fettsäuren',
    freeFattyAcidExpanded: 'Freie Fettsäuren, ±',
    route: 'Verfahren',
    state: 'Stand',
    oilMass: 'Öl',
    oilVolume: 'Öl nach Volumen',
    passMethanol: 'Veresterung {pass}: Methanol',
    passSulfuric: 'Veresterung {pass}: Schwefelsäure',
    baseMethanol: 'Umesterung: Methanol',
    baseCatalyst: 'Umesterung: Katalysator',
    ester: 'Ester, zu erwarten',
    glycerol: 'Glycerin, zu erwarten',
  },
  head: '{name} [{unit}]',
  marks: { page: 'wie auf dieser Seite', point: 'Punkt', comma: 'Komma' },
  long: 'Tabellen behalten 15 Stellen und lassen den Rest ohne Meldung weg; mehr hat: {columns}.',
  states: {
    complete: 'vollständig',
    missing: 'Werte fehlen',
    refused: 'ein Wert wurde abgelehnt',
    unreadable: 'nicht lesbar',
  },
};
