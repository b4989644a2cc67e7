/** The titrant of the site, in its own section. */
export const enTitrant = {
  note: 'For every lot of this site, until the titrant is too old. A strength typed for a lot goes before it.',
  khp: 'Dry KHP is weighed, dissolved in water and titrated with the titrant; dry it for 2 h at 105 to 120 °C first.',
  result: 'titrant strength',
};
