/** Why a route was named. */
export const enReasons = {
  'at-or-below-direct-limit': 'FFA {ffa} % is within this site’s direct limit of {limit} %.',
  'above-direct-limit': 'FFA {ffa} % is above this site’s direct limit of {limit} %.',
  'above-pretreatment-limit': 'FFA {ffa} % is above the {limit} % that the acid step takes here.',
  'within-guard-band': 'FFA {ffa} % is within {guard} % of the limit of {limit} %; the safe route is named.',
  'extra-negligible': 'At or below {limit} % the extra catalyst is negligible.',
  'no-acid-proof-equipment': 'The site profile says there is no acid-proof equipment.',
  'dry-before-base-step': 'Dry the oil first: water {water} % is above {limit} % for the base step.',
  'dry-before-acid-step': 'Dry the oil first: water {water} % is above {limit} % for the acid step.',
  'water-not-measured': 'Water was not measured: the usual {water} % is assumed, and the water limit is not checked.',
  'pretreatment-misses-target': 'Even {passes} passes are expected to leave up to {left} % FFA, above the target of {target} %.',
  'ffa-not-known': 'The route follows from the free fatty acid.',
  'no-guard-band': 'Decided without a guard band: how well the FFA is known cannot be said while a figure of the equipment is missing or refused. See the site values.',
  'runs-differ': 'The runs lie further apart than they may: see the titration before relying on this.',
  'more-runs-settle': 'Further runs that would settle it, if their mean stays: {runs}.',
  'many-runs-settle': 'It lies so near the limit that even {runs} runs in all would not settle it.',
  'no-runs-settle': 'No further run would settle it: most of what is left comes from the {source}.',
};

/** Remarks on figures that can be and yet deserve a second look, each with what to do. */
export const enNotices = {
  'one-run': 'One run, not checked by a second.',
  'run-incomplete': 'Run {run} is not complete and does not count yet.',
  'runs-tenfold': 'One run gives several times the acid of another: check the decimal marks of sample and burette.',
  'target-not-reached': 'Even {passes} passes are expected to leave up to {left} % FFA.',
  'lauric-on-other-basis': 'Coconut-like fat counted on another acid: choose lauric acid.',
  'titre-small': 'Run {run}: only {titre} mL, so a drop weighs heavily. Take more sample or a weaker titrant.',
  'titre-above-burette': 'Run {run}: the burette holds {capacity} mL. Take less sample or a stronger titrant, or set the burette in the site values.',
  'portion-unusual': 'Run {run}: the method takes about {wanted} g for an acid value near {acidValue}, not {mass} g. Check the balance reading, or weigh anew.',
  'strength-perhaps-grams': '{strength} mol/L is unusual; the figure fits g/L. Check the unit.',
  'strength-perhaps-moles': '{strength} g/L is unusual; the figure fits mol/L. Check the unit.',
  'strength-unlikely': '{strength} mol/L is unusual: titrants lie between 0.01 and 1.5 mol/L. Check figure and unit.',
  'blank-large': 'The blank is {share} % of the titre. Neutralise the solvent, or use fresh solvent.',
  'titrant-old': 'The titrant was standardised {days} days before; this site allows {limit}. Standardise it again.',
  'titrant-age-unknown': 'The day of the standardisation is not given, so the titrant’s age is not checked. Give the date.',
  'titrant-not-standardised': 'The titrant was weighed out, not standardised: its strength is uncertain. Standardise it against KHP.',
  'standardisation-differs': 'The {runs} standardisations lie {range} mol/L apart; {critical} is the most. Run another, or strike out a wrong one with its reason.',
  'purity-as-fraction': 'Purity as a fraction? {meant} % would be usual. Type it in per cent.',
  'date-in-future': 'This day is still to come. Check the date.',
  'temperature-not-corrected': 'The titrant was {gap} °C away from the temperature of its standardisation and this site does not correct for it. Let it come to temperature, or correct.',
  'batch-above-vessel': 'The batch of {volume} L is above the {working} L that the vessel is filled to. Split the lot.',
  'batch-too-wet': 'Water in the batch comes to {water} % of the oil, above this site’s {limit} %: less ester, more soap. Dry the oil, or take a methoxide.',
  'soap-above-limit': 'Soap comes to {soap} % of the oil, above this site’s {limit} %: the layers will hardly part. Take the two-step route, or blend.',
  'retest-higher': 'The retest of {after} % FFA is above the {before} % before the acid step, which makes no acid. Check whether the two are swapped; mineral acid left in the oil titrates, too: settle longer and draw a fresh sample.',
  'methanol-little-for-catalyst': '{load} g of catalyst a litre of methanol is near or above the {solubility} g that dissolve. Take more methanol or a solution.',
};

/** What was made of the runs, and the next step. */
export const enReplicates = {
  agree: 'Mean of {runs} runs: they lie {range} mg/g apart, at most {critical} may be.',
  differMean: 'Mean of {runs} runs for now: they lie {range} mg/g apart, more than the {critical} that may be.',
  differMedian: 'Median of {runs} runs: they lie {range} mg/g apart, more than the {critical} that may be.',
  next: {
    'second-run': 'Next: a second run.',
    'one-more': 'Next: one more run.',
    'two-more': 'Next: two more runs.',
    'look-for-cause': 'Next: look for the cause in sampling, titrant or end point, then begin anew. A run known to be wrong is struck out with its reason.',
  },
};
