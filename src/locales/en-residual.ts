/** The prediction of the acid step over time. */
export const enResidual = {
  title: 'What the acid step leaves over time',
  label: 'Free fatty acid from {start} % down to between {fast} and {slow} % after {time} min; the target is {target} %.',
  labelPasses: 'Free fatty acid from {start} % down to between {fast} and {slow} % after {passes} passes, {time} min in all; the target is {target} %.',
  target: 'target',
  sooner: 'The cautious end reaches the target after {reached} min.',
  later: 'The cautious end does not reach the target in this time. More time, warmer (below {boiling} °C), drier oil or more acid brings it nearer.',
  estimate: 'A band, wide on purpose: published times differ tenfold. Retest before the base step.',
  lacking: 'The estimate follows once oil, acid content and the acid step’s figures are known.',
};
