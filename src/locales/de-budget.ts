import type { Texts } from './en.js';

/** Wie genau ein Wert bekannt ist. */
export const deBudget: Texts['budget'] = {
  combined: 'erweiterte Messunsicherheit, U = 2 u, etwa 95 %; u = {u}',
  caption: 'Woher sie kommt, größter Beitrag zuerst',
  simulation: 'Monte-Carlo',
  source: 'Quelle',
  share: 'Anteil an der Varianz',
  alone: 'u daraus allein',
  more: '{sources} weitere Quellen machen je weniger als 0,5 % aus.',
  oneMore: 'Eine weitere Quelle macht weniger als 0,5 % aus.',
};
