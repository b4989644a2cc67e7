import type { Widened } from './en.js';
import type { enResidual } from './en-residual.js';

/** Die Vorhersage der Veresterung über die Zeit. */
export const deResidual: Widened<typeof enResidual> = {
  title: 'Was die Veresterung mit der Zeit übrig lässt',
  label: 'FFA von {start} % auf {fast} bis {slow} % nach {time} min; das Ziel ist {target} %.',
  labelPasses: 'FFA von {start} % auf {fast} bis {slow} % nach {passes} Durchgängen, insgesamt {time} min; das Ziel ist {target} %.',
  target: 'Ziel',
  sooner: 'Das vorsichtige Ende erreicht das Ziel nach {reached} min.',
  later: 'Das vorsichtige Ende erreicht das Ziel in dieser Zeit nicht. Mehr Zeit, mehr Wärme (unter {boiling} °C), trockeneres Öl oder mehr Säure bringen es näher.',
  estimate: 'Ein Band, absichtlich breit: veröffentlichte Zeiten gehen um das Zehnfache auseinander. Vor der Umesterung nachtitrieren.',
  lacking: 'Die Schätzung folgt, sobald Öl, Säuregehalt und die Angaben zur Veresterung bekannt sind.',
};
