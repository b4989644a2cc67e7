import type { Widened } from './en.js';
import type { enChargeSheet } from './en-charge-sheet.js';

/** Der Ansatz auf Papier, je Schritt eine Seite. */
export const deChargeSheet: Widened<typeof enChargeSheet> = {
  title: 'Ansatz',
  pageOf: 'Seite {page} von {pages}',
  source: 'Herkunft',
  date: 'Datum',
  oil: 'Öl',
  titrated: 'Bestimmungen',
  water: 'Wasser',
  insolubles: 'Unlösliches',
  notMeasured: 'nicht gemessen',
  certificate: 'laut Zertifikat',
  done: 'erledigt',
  what: 'In dieser Reihenfolge',
  amount: 'Menge',
  exactly: 'genau',
  charged: 'Tatsächlich',
  hold: 'Temperatur, von – bis, und Zeit',
  check: 'Zur Gegenrechnung',
  chargedBy: 'Angesetzt von',
  checkedBy: 'Geprüft von',
  signature: 'Name, Datum und Uhrzeit',
  defer: 'Dieses Blatt ist eine Rechenhilfe. Betriebsanweisungen, Sicherheitsdatenblätter, örtliches Brandschutz- und Abfallrecht und zugelassene Fachpraxis gehen vor.',
};
