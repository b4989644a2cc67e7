import type { enCost } from './en-cost.js';
import type { Widened } from './en.js';

/** Was beide Verfahren kosten. */
export const deCost: Widened<typeof enCost> = {
  title: 'Kosten beider Verfahren',
  prices: 'Preise und Sätze des Betriebs',
  money: '¤ ist die eigene Währung. Was keinen Preis hat, bleibt außen vor.',
  part: 'Posten',
  direct: 'direkt',
  twoStep: 'zweistufig',
  perTonne: 'je Tonne Öl',
  batch: 'gesamt je Ansatz',
  yield: 'Ester je Tonne Öl',
  dearer: 'Zweistufig kostet je Tonne Öl {difference} ¤ mehr als direkt.',
  cheaper: 'Zweistufig kostet je Tonne Öl {difference} ¤ weniger als direkt.',
  unpriced: 'Ohne Preis und außen vor: {prices}.',
  none: 'Noch kein Preis eingetragen. Oben die Preise des Betriebs angeben.',
  breakEven: 'Bis {ffa} % FFA ist {below} das billigere Verfahren, darüber {above}.',
  same: 'gleich',
  always: 'Von 0,1 bis 40 % FFA ist durchweg {route} das billigere Verfahren.',
  plot: 'Kosten je Tonne Öl über den freien Fettsäuren, beide Verfahren; diese Partie bei {ffa} %.',
  plotEmpty: 'Kosten je Tonne Öl über den freien Fettsäuren, beide Verfahren.',
  here: 'diese Partie',
};
