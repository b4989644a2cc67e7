/** The workbook of lots with live formulas. Names of sheets stand in formulas: letters only. */
export const enWorkbook = {
  sheets: { notes: 'Notes', lots: 'Lots', site: 'Site', working: 'Working' },
  title: 'Titration and charge, worked out',
  notes: [
    'A calculating aid. The procedures of the site, safety data sheets, local fire and waste codes and licensed practice come before it.',
    '“Lots” holds what was typed, a row a lot; “Site” holds the figures and options that stand for every lot. Both may be changed: “Working” follows.',
    '“Working” has every quantity as a formula over the cells above it, a column a lot. Rows that no lot needed are folded away.',
    'An option is the word in its cell, as the key in “Site” names it. A cell left empty in “Lots” takes the one of “Site”.',
    'A unit is the sign in its cell. Another sign of the same kind converts the figure; one that does not fit makes it not known.',
    'Which runs count, and how many there are, stays as it was when this file was written. Route and ± are not decided here.',
    '¤ is the site’s own money.',
  ],
  made: 'Lots: {count}.',
  noLots: 'No lots.',
  shortened: 'Sheets keep 15 digits. Rounded here: {where}, {text}.',
  leftOut: 'Left out, since it could not be read: {name}.',
  unnamed: 'Lot {n}',
  notKnown: 'not known',
  heads: {
    name: 'Name', key: 'Key', symbol: 'Symbol', unit: 'Unit', source: 'Source', site: 'Site', value: 'Value', struck: 'Struck out', unitOf: 'Unit',
  },
  /** Choices that follow from what was typed or found. */
  decided: {
    temperatureTaken: 'corrected for temperature', titrantStrengthBy: 'titrant strength given by', oilAmountBy: 'oil given by',
    oilPriceBy: 'price of oil given by', esterPriceBy: 'price of ester given by', methanolPriceBy: 'price of methanol given by',
    passes: 'passes of the acid step', baseStepAcidFrom: 'acid at the base step from', averageBy: 'runs averaged by', runsAgree: 'runs agree',
  },
  retest: 'retest: {name}',
  priced: 'priced: {name}',
  ofRoute: { direct: 'direct', twoStep: 'two-step' },
  setBySite: 'set by the site',
};
