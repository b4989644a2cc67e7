import type { Widened } from './en.js';
import type { enGiving } from './en-giving.js';

/** Ergebnisse an eine Tabelle geben. */
export const deGiving: Widened<typeof enGiving> = {
  title: 'Ergebnisse für eine Tabelle',
  note: 'Diese Partie als Zeile mit Überschriften oder als Arbeitsmappe, in der jede Zahl aus den Eingaben folgt.',
  nothing: 'Es gibt noch kein Ergebnis. Die Partie zuerst titrieren.',
  give: 'An eine Tabelle geben',
  target: 'Dezimalzeichen dort',
  targets: { page: 'wie auf dieser Seite', '.': 'Punkt', ',': 'Komma' },
  copy: 'Ergebnisse kopieren',
  copied: '{rows} Zeilen kopiert, mit ihren Überschriften.',
  copyByHand: 'Diese Seite darf nicht in die Zwischenablage schreiben. Die Zeilen stehen ausgewählt im Feld unten: von dort kopieren.',
  csv: 'Ergebnisse als CSV',
  workbook: 'Arbeitsmappe mit Formeln',
  workbookMost: 'Eine Arbeitsmappe nimmt höchstens {most} Partien; sie enthält die ersten {most}.',
  workbookFailed: 'Die Arbeitsmappe ließ sich nicht schreiben: {error}',
};
