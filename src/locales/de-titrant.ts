import type { Texts } from './en.js';

/** Die Maßlösung des Betriebs. */
export const deTitrant: Texts['titrant'] = {
  note: 'Für jede Partie dieses Betriebs, bis die Lösung zu alt ist. Ein Gehalt, der für eine Partie eingegeben wird, geht vor.',
  khp: 'Trockenes KHP einwägen, in Wasser lösen und mit der Maßlösung titrieren; vorher 2 h bei 105 bis 120 °C trocknen.',
  result: 'Gehalt der Maßlösung',
  notStandardised: 'nicht gestellt',
  madeOn: 'gestellt am {date}',
  runs: 'Mittel der zählenden Bestimmungen: {runs}.',
  ofSite: 'Maßlösung des Betriebs',
  ownStrength: 'Anderer Gehalt für diese Partie',
};
