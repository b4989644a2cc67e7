import type { Figure, LotEntry } from 'esterway/core';

// An invented day at an invented plant.

export const DAY = '2026-03-10';

export type LotName = 'clean' | 'borderline' | 'sour' | 'nonsense';

export interface Delivery {
  /** How `?lot=` names it. */
  readonly id: LotName;
  /** When it came in. */
  readonly time: string;
  readonly entry: LotEntry & { readonly name: string; readonly source: string };
}

const figure = (text: string, unit: string): Figure => ({ text, unit });
const doubtful = (typed: string, doubt: string, unit: string): Figure => ({ typed, doubt, unit });

const run = (sample: string, start: string, end: string): LotEntry['runs'][number] => ({
  sample: figure(sample, 'g'), start: figure(start, 'mL'), end: figure(end, 'mL'),
});

const METHOD = { sampleTakenBy: 'weighing', titrantAlkali: 'KOH', titrantSolvent: 'alcoholic', blankPolicy: 'solvent-neutralised' };

export const deliveries: readonly Delivery[] = [
  {
    id: 'clean',
    time: '06:35',
    entry: {
      version: 1,
      name: 'QM-0831',
      source: 'Harbour kitchens round',
      date: DAY,
      figures: {
        oilAmount: figure('1250', 'kg'),
        waterContent: figure('0.06', '%'),
        insolubles: figure('0.03', '%'),
      },
      options: METHOD,
      runs: [run('10.042', '0.00', '2.14'), run('10.017', '2.14', '4.27')],
      retestRuns: [],
    },
  },
  {
    id: 'borderline',
    time: '07:50',
    entry: {
      version: 1,
      name: 'QM-0832',
      source: 'Canteen round east',
      date: DAY,
      figures: {
        oilAmount: figure('980', 'L'),
        oilTemperature: figure('18', '°C'),
        waterContent: figure('0.09', '%'),
        insolubles: figure('0.08', '%'),
      },
      options: METHOD,
      runs: [run('3.021', '0.00', '3.18'), run('2.994', '3.18', '6.34')],
      retestRuns: [],
    },
  },
  {
    id: 'sour',
    time: '08:15',
    entry: {
      version: 1,
      name: 'QM-0833',
      source: 'Fairground stalls, end of season',
      date: DAY,
      figures: {
        oilAmount: figure('640', 'kg'),
        waterContent: figure('0.31', '%'),
        insolubles: figure('0.40', '%'),
      },
      options: METHOD,
      runs: [run('1.004', '0.00', '5.82'), run('0.991', '5.82', '11.57')],
      retestRuns: [],
    },
  },
  {
    id: 'nonsense',
    time: '08:55',
    entry: {
      version: 1,
      name: 'QM-0834',
      source: 'Drums without a label',
      date: DAY,
      figures: {
        oilAmount: doubtful('1,500', 'ambiguous', 'kg'),
        waterContent: figure('130', '%'),
        insolubles: doubtful('0.3.1', 'two-marks', '%'),
      },
      options: METHOD,
      runs: [
        { sample: figure('2.508', 'g'), start: figure('12.40', 'mL'), end: figure('3.10', 'mL') },
        { sample: doubtful('about 2', 'not-a-number', 'g'), start: figure('0.00', 'mL'), end: figure('3.05', 'mL') },
      ],
      retestRuns: [],
    },
  },
];
