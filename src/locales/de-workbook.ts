import type { enWorkbook } from './en-workbook.js';
import type { Widened } from './en.js';

/** Die Arbeitsmappe der Partien mit lebenden Formeln. Namen der Blätter stehen in Formeln: nur Buchstaben. */
export const deWorkbook: Widened<typeof enWorkbook> = {
  sheets: { notes: 'Hinweise', lots: 'Partien', site: 'Betrieb', working: 'Rechenweg' },
  title: 'Titration und Ansatz, durchgerechnet',
  notes: [
    'Eine Rechenhilfe. Betriebsanweisungen, Sicherheitsdatenblätter, örtliche Brandschutz- und Abfallvorschriften und zugelassene Fachleute gehen vor.',
    '„Partien“ enthält, was eingetragen wurde, eine Zeile je Partie; „Betrieb“ die Werte und Auswahlen, die für jede Partie gelten. Beides lässt sich ändern: „Rechenweg“ folgt.',
    '„Rechenweg“ hat jede Größe als Formel über den Zellen darüber, eine Spalte je Partie. Zeilen, die keine Partie brauchte, sind eingeklappt.',
    'Eine Auswahl ist das Wort in ihrer Zelle, so wie „Betrieb“ es schreibt. Was in „Partien“ leer bleibt, kommt aus „Betrieb“.',
    'Eine Einheit ist das Zeichen in ihrer Zelle. Ein anderes Zeichen derselben Art rechnet den Wert um; eines, das nicht passt, macht ihn unbekannt.',
    'Welche Titrationen zählen und wie viele es sind, bleibt wie beim Schreiben dieser Datei. Verfahren und ± werden hier nicht entschieden.',
    '¤ ist das Geld des Betriebs.',
  ],
  made: 'Partien: {count}.',
  noLots: 'Keine Partien.',
  shortened: 'Tabellen behalten 15 Stellen. Hier gerundet: {where}, {text}.',
  leftOut: 'Ausgelassen, weil nicht lesbar: {name}.',
  unnamed: 'Partie {n}',
  notKnown: 'nicht bekannt',
  heads: {
    name: 'Bezeichnung', key: 'Schlüssel', symbol: 'Zeichen', unit: 'Einheit', source: 'Quelle', site: 'Betrieb', value: 'Wert', struck: 'Gestrichen', unitOf: 'Einheit',
  },
  /** Was sich aus dem Eingetragenen oder Gefundenen ergibt. */
  decided: {
    temperatureTaken: 'Temperatur korrigiert', titrantStrengthBy: 'Gehalt der Maßlösung angegeben als', oilAmountBy: 'Öl angegeben als',
    oilPriceBy: 'Ölpreis angegeben je', esterPriceBy: 'Esterpreis angegeben je', methanolPriceBy: 'Methanolpreis angegeben je',
    passes: 'Durchgänge der Veresterung', baseStepAcidFrom: 'Säure vor der Umesterung aus', averageBy: 'Titrationen gemittelt als', runsAgree: 'Titrationen stimmen überein',
  },
  retest: 'Nachtitration: {name}',
  priced: 'mit Preis: {name}',
  ofRoute: { direct: 'direkt', twoStep: 'zweistufig' },
  setBySite: 'vom Betrieb festgelegt',
};
