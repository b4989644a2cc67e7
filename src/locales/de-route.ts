import type { Widened } from './en.js';
import type { enRoute } from './en-route.js';

/** Das Verfahren, die Bürettenskala und die anderen Wege. */
export const deRoute: Widened<typeof enRoute> = {
  scale: 'FFA {ffa} % auf einer Skala von 0 bis {most} %; Direktgrenze {limit} %.',
  scaleEmpty: 'Skala von 0 bis {most} %; Direktgrenze {limit} %. FFA noch nicht bekannt.',
  odds: 'Der wahre Wert liegt mit {below} % Wahrscheinlichkeit bei höchstens {limit} %, mit {above} % darüber.',
  directMark: 'Direkt- grenze',
  pretreatmentMark: 'Verest.- grenze',
  directAllTheSame: 'Trotzdem direkt',
  twoStepAllTheSame: 'Trotzdem zweistufig',
  passes: '{passes} × Veresterung',
  onePass: '1 × Veresterung',
  soap: 'Seife',
  blend: 'Auf {limit} % verschneiden',
  blendWith: 'Öl mit {ffa} %',
  delivery: 'Anlieferung: annehmen, zurückstellen, ablehnen',
  fromStock: 'Aus dem Bestand verschneiden',
  published: 'Veröffentlichte Direktgrenzen',
  publishedRange: '0,5 bis 5\u00a0%',
  publishedList: [
    'Säurezahl unter 1, etwa 0,5 % FFA: Wright et al. 1944; Freedman et al. 1984',
    'unter 0,5 % FFA und 0,06 % Wasser, Talg: Ma et al. 1998',
    'unter 1 % nach der Veresterung: Canakci und Van Gerpen 2001',
    'unter 3 %: Kombe et al. 2013, Übersicht',
    'bis etwa 5 % mit Laugenzuschlag: Van Gerpen 2005, aus dem Gedächtnis',
  ],
};
