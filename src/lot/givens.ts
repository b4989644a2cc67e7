import { outlayRates } from '../chemistry/cost.js';
import { passesNeeded } from '../decision/passes.js';
import { anyPriced, isPriced } from '../decision/priced.js';
import { rangeKept } from '../decision/replicates.js';
import type { Findings, Givens } from '../formula/plan.js';
import { Missing, Refused, isKnown } from '../formula/reading.js';
import type { Outcome, Unknown } from '../formula/reading.js';
import type { Sheet } from '../formula/sheet.js';
import type { Unit } from '../formula/unit.js';
import { TYPED_UNITS } from '../formula/units.js';
import { DEFAULT_FIGURES, DEFAULT_OPTIONS } from './defaults.js';
import type { LotEntry, SiteProfile } from './entry.js';
import { readFigure } from './figure.js';
import type { Figure } from './figure.js';
import { OPTION_BY_UNIT, fieldOf, runCell } from './keys.js';
import { runState } from './runs.js';

/** Where a given figure or option comes from. */
export type Origin = 'entry' | 'site' | 'default' | 'none';

/** Finds what a plan asks for: in the lot, else in the site profile, else among the defaults. */
export class LotGivens implements Givens {
  constructor(
    private readonly sheet: Sheet,
    private readonly entry: LotEntry,
    private readonly site: SiteProfile,
  ) {}

  input(key: string): Outcome {
    const field = fieldOf(key);
    const { unit } = this.sheet.quantity(key);
    const typed = this.typed(key, field);
    if (typed) return readFigure(typed, unit, field);
    const standing = this.site.figures[field] ?? DEFAULT_FIGURES[field];
    if (standing) return readStanding(standing, unit, field);
    return new Missing([field]);
  }

  option(key: string, findings: Findings): string | Unknown {
    if (key === 'passes') {
      return passesNeeded((pass) => findings.outcome(`pass${pass}.ffaLeft.slow`), findings.outcome('pretreatmentTarget'));
    }
    if (key === 'temperatureTaken') return this.temperatureTaken() && this.chosen('temperatureCorrected') !== 'no' ? 'yes' : 'no';
    if (key.startsWith('priced.')) {
      const what = key.slice('priced.'.length);
      const outcomeOf = (rate: string): Outcome => findings.outcome(rate);
      return what === 'direct' || what === 'twoStep' ? anyPriced(outlayRates(what).map(outcomeOf)) : isPriced(outcomeOf(what));
    }
    const replicate = /^(retest\.)?(averageBy|runsAgree)$/.exec(key);
    if (replicate) return this.replicates(replicate[1] as 'retest.' | undefined ?? '', replicate[2] === 'runsAgree', findings);
    if (key === 'baseStepAcidFrom') return this.hasRetest() ? 'retest' : 'estimate';
    const byUnit = OPTION_BY_UNIT[key];
    if (byUnit) {
      const figure = this.entry.figures[byUnit.field] ?? this.site.figures[byUnit.field];
      if (!figure) return new Missing([byUnit.field]);
      const unit = TYPED_UNITS.get(figure.unit);
      return unit ? byUnit.of(unit) : new Refused({ code: 'unknown-unit', quantity: byUnit.field, params: { unit: figure.unit } });
    }
    const option = this.chosen(key);
    if (key === 'blankPolicy' && option === 'solvent-neutralised' && this.blankTyped()) {
      return new Refused({ code: 'blank-with-neutralised-solvent', quantity: 'blank' });
    }
    return option ?? new Missing([key]);
  }

  /** Whether runs lie close enough for their mean. */
  private replicates(prefix: '' | 'retest.', asked: boolean, findings: Findings): string | Unknown {
    const agree = rangeKept(findings, prefix);
    if (typeof agree !== 'boolean') return agree;
    return asked ? (agree ? 'yes' : 'no') : agree ? 'mean' : 'median';
  }

  /** Whether the temperature at the titration was given, for the lot or the site. */
  temperatureTaken(): boolean {
    return 'titrationTemperature' in this.entry.figures || 'titrationTemperature' in this.site.figures;
  }

  /** The option of a choice as given, whatever follows from it. */
  chosen(key: string): string | undefined {
    // a strength typed for the lot is meant for it, whatever titrant the site has
    if (key === 'titrantKnownFrom' && !this.entry.options[key] && this.entry.figures['titrantStrength']) return 'label';
    return this.entry.options[key] ?? this.site.options[key] ?? DEFAULT_OPTIONS[key];
  }

  origin(key: string): Origin {
    const field = fieldOf(key);
    if (this.typed(key, field) ?? this.entry.options[field]) return 'entry';
    if (this.site.figures[field] ?? this.site.options[field]) return 'site';
    return field in DEFAULT_FIGURES || field in DEFAULT_OPTIONS ? 'default' : 'none';
  }

  /** An input's figure as it was written, where it is in the quantity's own unit. */
  written(key: string): string | undefined {
    const field = fieldOf(key);
    const figure = this.typed(key, field) ?? this.site.figures[field] ?? DEFAULT_FIGURES[field];
    return figure && 'text' in figure && figure.unit === this.sheet.quantity(key).unit.symbol ? figure.text : undefined;
  }

  /** Whether the oil was titrated again after the acid step, or a value for it was given. */
  hasRetest(): boolean {
    const { figures, retestRuns } = this.entry;
    switch (this.chosen('retest.acidKnownFrom')) {
      case 'certificate-acid-value':
        return 'retest.certificateAcidValue' in figures;
      case 'certificate-ffa':
        return 'retest.certificateFfa' in figures;
      default:
        return retestRuns.some((run) => runState(run) === 'counted');
    }
  }

  private blankTyped(): boolean {
    const outcome = this.input('blank');
    return !(outcome instanceof Missing) && !(isKnown(outcome) && outcome.isZero());
  }

  private typed(key: string, field: string): Figure | undefined {
    const run = runCell(key);
    if (!run) return this.entry.figures[field];
    const runs = run.list === 'titrantRuns' ? (this.site.titrantRuns ?? []) : this.entry[run.list];
    return runs[run.index]?.[run.cell];
  }
}

/** Site values and defaults are the same objects lot after lot, so each is read once. */
function readStanding(figure: Figure, unit: Unit, field: string): Outcome {
  let reading = STANDING.get(figure);
  if (reading?.unit !== unit) STANDING.set(figure, (reading = { unit, outcome: readFigure(figure, unit, field) }));
  return reading.outcome;
}

const STANDING = new WeakMap<Figure, { readonly unit: Unit; readonly outcome: Outcome }>();
