/** How well a figure is known. */
export const enBudget = {
  combined: 'expanded uncertainty, U = 2 u, about 95 %; u = {u}',
  caption: 'Where it comes from, largest first',
  simulation: 'Monte Carlo',
  source: 'Source',
  share: 'Share of the variance',
  alone: 'u of it alone',
  more: '{sources} further sources make up less than 0.5 % each.',
  oneMore: 'One further source makes up less than 0.5 %.',
};
