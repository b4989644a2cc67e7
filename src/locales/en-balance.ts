/** The mass balance of a batch. */
export const enBalance = {
  title: 'Mass balance',
  label: 'Flow of the batch from top to bottom, each width by its mass: {oil} of oil come in, {ester} leave as ester layer, {glycerol} as glycerol layer.',
  steps: { pass: 'Acid step', passOf: 'Acid step, pass {n}', retest: 'Retest', react: 'Base step', settle: 'Neutralise and settle' },
  streams: {
    oil: 'oil', methanol: 'methanol', sulfuricAcid: 'sulfuric acid', catalyst: 'catalyst', mixture: 'mixture', neutralisingAcid: 'neutralising acid', drawnOff: 'layer drawn off',
    esterLayer: 'ester layer', glycerolLayer: 'glycerol layer',
  },
  places: {
    oil: 'oil', methanol: 'methanol', sulfuricAcid: 'acid', catalyst: 'catalyst', mixture: 'mixture', neutralisingAcid: 'acid', drawnOff: 'drawn off', esterLayer: 'upper', glycerolLayer: 'lower',
  },
  ofLayer: '{layer} ({place})',
  components: {
    glycerides: 'glycerides', freeAcid: 'free fatty acid', ester: 'ester', glycerol: 'glycerol', soap: 'soap', methanol: 'methanol', water: 'water', catalyst: 'catalyst',
    sulfuricAcid: 'sulfuric acid', sulfate: 'sulfate', neutralisingAcid: 'neutra\u00adlising acid', salt: 'salt', solids: 'insol\u00adubles and rest',
  },
  substance: 'Substance',
  in: 'in',
  out: 'out',
  predicted: 'predicted',
  counted: 'titrated',
  total: 'total',
  difference: 'in less out',
  changed: 'changed by the retest',
  retested: 'The titration after the acid step takes the place of the prediction, and counts sulfuric acid left in the oil among the free fatty acid. What it changes is no loss.',
  cautious: 'The acid step by the cautious end of its prediction.',
  catalyst: 'Catalyst counts as it was charged while it drives the reaction; neutralised, it becomes salt, and water or methanol.',
  volumes: 'Volumes: each substance by its own density, soap by that of water, added up (common practice, no source).',
};
