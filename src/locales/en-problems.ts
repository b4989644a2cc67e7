import { enBatchProblems } from './en-batch-quantities.js';

/** Why a figure cannot be used, and what to do about it. */
export const enProblems = {
  ambiguous: '“{typed}” can be read in two ways. Which one is meant?',
  'two-marks': '“{typed}” has more than one decimal mark. Type one comma or one point.',
  'not-a-number': '“{typed}” is not a figure. Type digits only, such as 3.72.',
  'has-unit': '“{typed}” has its unit with it. Type the figure alone; the unit stands beside the field.',
  exponent: '“{typed}” is written with an exponent. Write the figure out.',
  'too-many-digits': 'More digits than any balance gives: at most 34 are read. Round the figure.',
  'unknown-unit': 'The unit “{unit}” is not known here. Choose one of those offered.',
  'unit-does-not-fit': '“{unit}” does not fit here; {needed} is needed. Choose another unit.',
  'not-above-zero': 'This must be more than zero. Check the reading.',
  negative: 'This cannot be negative. Remove the minus sign.',
  'out-of-range': 'Beyond what is possible here: the limit is {bound} {unit}. Check the figure and its unit.',
  'above-100-percent': 'More than 100 %. Check the figure and its unit.',
  'end-below-start': 'The end is below the start. A burette reads downwards: check both, or whether they are swapped.',
  'titre-not-above-blank': 'The titre is not above the blank, so no acid would be found. Check both readings and the blank.',
  'ffa-above-100': 'This gives more than 100 % free fatty acid. Check sample, burette readings, and whether the strength is in mol/L or g/L.',
  'blank-with-neutralised-solvent': 'Neutralised solvent has no blank: subtracting one as well reports too little acid. Empty the blank, or choose “blank subtracted”.',
  'below-stoichiometric': 'The reaction itself takes {bound} mol of methanol a mol of oil. Charge more.',
  'above-boiling-point': 'Methanol boils at {bound} °C. Stay below it.',
  'nothing-left-as-glyceride': 'Acid, water and insolubles leave no glyceride. Check the water, the insolubles and the titration.',
  'acid-above-saponification': 'The acid value is above the saponification value, which cannot be. Check both.',
  'division-by-zero': 'This cannot be worked out: a divisor is zero. Check the figures it rests on.',
  'root-of-negative': 'This cannot be worked out from these figures. Check the figures it rests on.',
  'logarithm-of-nothing': 'This cannot be worked out from these figures. Check the figures it rests on.',
  'not-finite': 'This grows beyond all bounds with these figures. Check the figures it rests on.',
  'unknown-option': '“{option}” is none of the choices. Choose one of those offered.',
  ...enBatchProblems,
  other: 'This figure cannot be used ({code}). Check it.',
};

/** Why a document cannot be read. */
export const enFaults = {
  title: 'This lot cannot be read.',
  'not-an-object': 'It is not a lot entry.',
  'newer-version': 'It was written by a newer version ({found}). Update the page, or open it where it was written.',
  'unknown-version': 'It names no known version.',
  'unknown-key': '“{path}” is not known here.',
  'wrong-type': '“{path}” is not of the kind expected.',
  'too-long': '“{path}” is too long.',
  'unknown-option': '“{found}” is not a choice for “{path}”.',
};
