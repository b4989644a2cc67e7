/** The titrant of the site. */
export const enTitrant = {
  note: 'For every lot of this site, until the titrant is too old. A strength typed for a lot goes before it.',
  khp: 'Dry KHP is weighed, dissolved in water and titrated with the titrant; dry it for 2 h at 105 to 120 °C first.',
  result: 'titrant strength',
  notStandardised: 'not standardised',
  madeOn: 'standardised on {date}',
  runs: 'Mean of the runs that count: {runs}.',
  ofSite: 'The site’s titrant',
  ownStrength: 'Another strength for this lot',
};
