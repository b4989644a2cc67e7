import type { Widened } from './en.js';
import type { enPlan } from './en-plan.js';

/** Eine Titration planen. */
export const dePlan: Widened<typeof enPlan> = {
  none: 'Erwartete Säurezahl angeben, nach den letzten Partien dieser Herkunft oder nach Augenschein.',
  noTitrant: 'Für einen Plan fehlt der Gehalt der Maßlösung.',
  weigh: 'Etwa {portion} g einwägen: Verbrauch um {titre} mL bei {strength} mol/L.',
  measure: 'Etwa {portion} mL abmessen: Verbrauch um {titre} mL bei {strength} mol/L.',
  change: 'Besser eine andere Maßlösung: {strength} mol/L. Mit etwa {portion} g liegt der Verbrauch um {titre} mL.',
  unlikeTable: 'Die Methode sieht {tablePortion} g vor; keine übliche Maßlösung passt zu Methode und Bürette.',
  expect: 'Zwei Bestimmungen sollten ± {expanded} mg/g lassen.',
  goodPart: 'So gewählt, dass der Verbrauch 20 bis 80 % der Bürette von {capacity} mL füllt (gängige Praxis, ohne Quelle).',
};
