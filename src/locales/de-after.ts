import type { enAfter } from './en-after.js';
import type { Widened } from './en.js';

/** Nach der Reaktion. */
export const deAfter: Widened<typeof enAfter> = {
  title: 'Nach der Reaktion',
  hold: '{time} bei {temperature} halten, dann {settling} absetzen lassen (Vorgaben des Betriebs; 55 bis 65 °C, 30 bis 60 min und ein Tag sind gängige Praxis, ohne Quelle).',
  heat: 'Das Lösen des Katalysators erwärmt das Methanol ohne Kühlung um {rise} °C auf {reached} °C (mit der Lösungswärme in Wasser gerechnet, ein Anhaltswert).',
  boils: 'Das Lösen des Katalysators könnte das Methanol um {rise} °C auf {reached} °C erwärmen: nahe oder über dem Siedepunkt von 64,7 °C. In kleinen Portionen zugeben, gekühlt und gerührt, unter Rückfluss.',
  heatUnknown: 'Für diesen Katalysator ist keine Lösungswärme veröffentlicht; trotzdem vorsichtig arbeiten und einen eigenen Wert eintragen, wenn es ihn gibt.',
  neutralise: 'Zum Neutralisieren des übrigen Katalysators',
  split: 'Zusätzlich, um auch die Seife zu spalten',
  layers: 'Schichten nach dem Absetzen, Neutralisationssäure eingerechnet',
  upper: 'oben: Ester',
  lower: 'unten: Glycerin, Seife, Wasser',
  share: '{share} des Ölvolumens',
  product: 'Prüfung des Produkts',
  productGood: 'Säurezahl {value} hält die Grenze von {limit} ein.',
  productBad: 'Säurezahl {value} liegt über der Grenze von {limit}: Säure auswaschen oder Seife spalten, dann neu titrieren.',
  soap: 'Seife und restlicher Katalysator, mit zwei Indikatoren',
  soapHow: 'Mit Salzsäure titrieren: Phenolphthalein bis farblos, dann Bromphenolblau bis gelb.',
  care: 'Säure langsam in die gerührte, gekühlte Mischung geben, nie umgekehrt; sie erwärmt sich und kann schäumen. Schutzbrille und Handschuhe. Die untere Schicht enthält Methanol: keine Zündquellen, bis zur Behandlung gefährlicher Abfall.',
};
