/** Planning a titration. */
export const enPlan = {
  none: 'Type the acid value to expect, from the source’s last lots or by its looks.',
  noTitrant: 'The titrant’s strength is needed for a plan.',
  weigh: 'Weigh in about {portion} g: it will take near {titre} mL of {strength} mol/L.',
  measure: 'Measure out about {portion} mL: it will take near {titre} mL of {strength} mol/L.',
  change: 'Better another titrant: {strength} mol/L. With about {portion} g it will take near {titre} mL.',
  unlikeTable: 'The method’s table has {tablePortion} g; no usual titrant fits both table and burette.',
  expect: 'Two runs should leave ± {expanded} mg/g.',
  goodPart: 'Chosen so that the titre fills 20 to 80 % of the burette of {capacity} mL (common practice, no source).',
};
