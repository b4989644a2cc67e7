import type { Widened } from './en.js';
import type { enTitrant } from './en-titrant.js';

/** Die Maßlösung des Betriebs, in ihrem eigenen Abschnitt. */
export const deTitrant: Widened<typeof enTitrant> = {
  note: 'Für jede Partie dieses Betriebs, bis die Lösung zu alt ist. Ein Gehalt, der für eine Partie eingegeben wird, geht vor.',
  khp: 'Trockenes KHP einwägen, in Wasser lösen und mit der Maßlösung titrieren; vorher 2 h bei 105 bis 120 °C trocknen.',
  result: 'Gehalt der Maßlösung',
};
