import type { enBalance } from './en-balance.js';
import type { Widened } from './en.js';

/** Die Massenbilanz eines Ansatzes. */
export const deBalance: Widened<typeof enBalance> = {
  title: 'Massenbilanz',
  label: 'Weg des Ansatzes von oben nach unten, Breiten nach Masse: {oil} Öl kommen hinein, {ester} gehen als Esterphase, {glycerol} als Glycerinphase ab.',
  steps: { pass: 'Veresterung', passOf: 'Veresterung, Durchgang {n}', retest: 'Nachtitration', react: 'Umesterung', settle: 'Neutralisieren, Absetzen' },
  streams: {
    oil: 'Öl', methanol: 'Methanol', sulfuricAcid: 'Schwefelsäure', catalyst: 'Katalysator', mixture: 'Gemisch', neutralisingAcid: 'Neutralisationssäure', drawnOff: 'abgezogen',
    esterLayer: 'Esterphase', glycerolLayer: 'Glycerinphase',
  },
  places: {
    oil: 'Öl', methanol: 'Methanol', sulfuricAcid: 'Säure', catalyst: 'Kataly\u00adsator', mixture: 'Gemisch', neutralisingAcid: 'Säure', drawnOff: 'abge\u00adzogen', esterLayer: 'oben', glycerolLayer: 'unten',
  },
  ofLayer: '{layer} ({place})',
  components: {
    glycerides: 'Glyceride', freeAcid: 'freie Fett\u00adsäuren', ester: 'Ester', glycerol: 'Glycerin', soap: 'Seife', methanol: 'Methanol', water: 'Wasser', catalyst: 'Kataly\u00adsator',
    sulfuricAcid: 'Schwefel\u00adsäure', sulfate: 'Sulfat', neutralisingAcid: 'Neutra\u00adlisations\u00adsäure', salt: 'Salz', solids: 'Unlös\u00adliches und Rest',
  },
  substance: 'Stoff',
  in: 'Zugang',
  out: 'Abgang',
  predicted: 'Prognose',
  counted: 'titriert',
  total: 'gesamt',
  difference: 'Zu- minus Abgang',
  changed: 'durch die Nachtitration geändert',
  retested: 'Die Nachtitration tritt an die Stelle der Vorhersage und zählt im Öl gebliebene Schwefelsäure zu den freien Fettsäuren. Was sie ändert, ist kein Verlust.',
  cautious: 'Die Veresterung nach dem vorsichtigen Ende ihrer Vorhersage.',
  catalyst: 'Solange der Katalysator wirkt, zählt er, wie er zugegeben wurde; neutralisiert wird er zu Salz und zu Wasser oder Methanol.',
  volumes: 'Volumen: jeder Stoff mit seiner eigenen Dichte, Seife mit der von Wasser, zusammengezählt (gängige Praxis, ohne Quelle).',
};
