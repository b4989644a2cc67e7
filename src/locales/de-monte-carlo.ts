import type { enMonteCarlo } from './en-monte-carlo.js';
import type { Widened } from './en.js';

/** Die Prüfung einer Messunsicherheit mit Monte Carlo. */
export const deMonteCarlo: Widened<typeof enMonteCarlo> = {
  start: 'Mit Monte Carlo prüfen',
  again: 'Noch einmal ziehen',
  stop: 'Abbrechen',
  progress: 'Ziehungen bisher',
  done: '{done} von {draws} Ziehungen',
  title: 'Erste Ordnung und Monte-Carlo-Rechnung nebeneinander',
  firstOrder: 'erste Ordnung',
  monteCarlo: 'Monte-Carlo',
  u: 'u',
  mean: 'Ergebnis, Mittel',
  interval: '95-%-Intervall',
  shortest: 'kürzestes 95 %',
  range: '{low} bis {high}',
  below: 'ist höchstens {limit}',
  verdicts: {
    agrees: 'Beide Wege stimmen überein: Die Enden ihrer Intervalle liegen höchstens {apart} auseinander, innerhalb einer halben Einheit der ersten Stelle von u, {tolerance}. Das ± ist verlässlich.',
    wider: 'Das ± liegt auf der sicheren Seite: Das Intervall nach Monte Carlo liegt innerhalb dessen der ersten Ordnung, seine Enden bis zu {apart} weiter innen; {tolerance} gälten noch als gleich.',
    differs: 'Die beiden Wege weichen voneinander ab: Die Enden ihrer Intervalle liegen bis zu {apart} auseinander, mehr als eine halbe Einheit der ersten Stelle von u, {tolerance}. Es gilt das Intervall nach Monte Carlo.',
  },
  plot: '{draws} Ziehungen von {from} bis {to}; 95 % davon zwischen {low} und {high}.',
  limitIn: 'Die Grenze von {limit} ist die gestrichelte Linie.',
  limitBeside: 'Die Grenze von {limit} liegt außerhalb der Zeichnung.',
  how: '{draws} Ziehungen nach JCGM 101 (Ergänzung 1 zum GUM), Startwert {seed}: Dieselbe Partie gibt dieselben Zahlen. Ihr u ist auf ± {error} sicher.',
  valueless: '{count} Ziehungen ergaben keinen Wert und bleiben außer Acht.',
  notKnown: 'Für eine Ziehung ist zu wenig bekannt: das Ergebnis, oder wie unsicher eine Größe ist, auf der es beruht.',
  noWorker: 'Diese Seite lässt keine Rechnung neben sich zu. Die Prüfung kann in der Seite laufen; einige Sekunden lang reagiert sie dann etwas träger.',
  inPage: 'In der Seite rechnen',
  failed: 'Die Prüfung endete mit einem Fehler: {error}',
};
