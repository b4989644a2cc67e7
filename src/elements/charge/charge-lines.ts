import { html, nothing } from 'lit';
import type { RouteName } from '../../chemistry/route-name.js';
import type { ChargeLine, ChargeStep } from '../../decision/charge.js';
import { amountIn } from '../../exchange/amount.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { fill, fillWith } from '../../locales/fill.js';
import { uncertainties } from '../../lot/uncertainty.js';
import { SectionElement } from '../parts/section.js';

/** The figure that each typed basis of the acid step counts on. */
export const METHANOL_FIGURE: Readonly<Record<string, { readonly key: string; readonly unit: string }>> = {
  'per-acid': { key: 'pretreatmentMethanolPerAcid', unit: 'mol/mol' },
  'per-oil': { key: 'pretreatmentMethanolPerOil', unit: 'mol/mol' },
  'oil-volume': { key: 'pretreatmentMethanolShare', unit: '%' },
};
export const ACID_FIGURE: Readonly<Record<string, { readonly key: string; readonly unit: string }>> = {
  'of-acid': { key: 'pretreatmentAcidOfAcid', unit: '%' },
  'of-oil': { key: 'pretreatmentAcidOfOil', unit: '%' },
  'oil-volume': { key: 'pretreatmentAcidShare', unit: '%' },
};

/** The lines of a charge in words: what to charge, by what rule, how well it is known, what can be dispensed. On the screen and on paper. */
export abstract class ChargeLines extends SectionElement {
  /** How well each amount of this reading is known. */
  #spreads: ReturnType<typeof uncertainties> = {};
  #spreadsOf: unknown;

  /** Amounts that either route asks for. */
  private get weighed(): readonly string[] {
    const { direct = [], twoStep = [] } = this.lot?.charges ?? {};
    return [...direct, ...twoStep].flatMap(({ lines }) => lines.flatMap(({ what, mass }) => (mass && !what.endsWith('oil') ? mass : [])));
  }

  /** The route that is shown. */
  abstract get looked(): RouteName;

  protected override willUpdate(): void {
    const { entry, site, reading } = this.desk;
    if (reading !== this.#spreadsOf && !this.folded) {
      this.#spreads = this.lot ? uncertainties(entry, site, this.weighed) : {};
      this.#spreadsOf = reading;
    }
  }

  protected known(key: string): boolean {
    return this.reading(key)?.value !== undefined;
  }

  protected titleOf(step: ChargeStep, all: readonly ChargeStep[]): string {
    const { charge } = this.texts;
    const passes = all.filter(({ step: kind }) => kind === 'acid').length;
    if (step.step === 'base') return charge.baseStep;
    return passes > 1 ? fill(charge.acidStepPass, { pass: String(step.pass), passes: String(passes) }) : charge.acidStep;
  }

  protected get hasRetest(): boolean {
    return this.reading('retest.acidContent')?.value !== undefined;
  }

  /** What the keys of a step begin with. */
  private partOf({ step, pass }: ChargeStep): string {
    return step === 'base' ? this.looked : `pass${pass}`;
  }

  /** Key of the amount in whole steps, where the site has named a step. */
  protected dispensedKey({ what }: ChargeLine, step: ChargeStep): string | undefined {
    const name = { methanol: 'methanolVolume', catalyst: 'catalyst', 'sulfuric-acid': 'sulfuric' }[what as string];
    const key = `${this.partOf(step)}.dispensed.${name}`;
    return name && this.known(key) ? key : undefined;
  }

  /** The amount that scale or meter can give, and what the rounding changes. */
  protected dispensed({ what }: ChargeLine, step: ChargeStep): unknown {
    const { charge } = this.texts;
    const from = this.partOf(step);
    const key = this.dispensedKey({ what }, step);
    if (!key) return nothing;
    const sentence = step.step !== 'base' ? charge.dispensed : what === 'methanol' ? charge.dispensedMethanol : charge.dispensedCatalyst;
    const ratio = this.plain(`${from}.dispensed.methanolRatio`);
    return html`<br />${fillWith(sentence, { amount: this.figure(key), ratio, load: this.plain(`${from}.dispensed.baseLoad`) })}`;
  }

  /** How well an amount to weigh is known, from the titration and the site's equipment. */
  protected spread(key: string): unknown {
    const known = this.#spreads[key];
    const unit = this.reading(key)?.unit;
    const expanded = known && new Decimal(known.expanded);
    if (!expanded || expanded.isZero() || unit === undefined) return nothing;
    const rounded = shownText(expanded, { significant: 2 });
    const amount = amountIn(rounded, rounded, unit, this.desk.units);
    return html` <span class="spread">± ${this.number(amount.text)}\u00a0${amount.unit}</span>`;
  }

  protected instruction({ what }: ChargeLine, step?: ChargeStep): string {
    const { forRun } = this.texts.charge;
    const key = what === 'oil' && step?.step === 'base' ? 'oil-direct' : what;
    return fill(forRun[key], {
      temperature: this.amountWords('pretreatmentTemperature') ?? '–',
      time: this.amountWords('pretreatmentTime') ?? '–',
      assay: this.plain({ methanol: 'methanolAssay', 'sulfuric-acid': 'sulfuricAssay', catalyst: 'catalystAssay' }[what as string] ?? ''),
      catalyst: this.catalystName,
    });
  }

  private get catalystName(): string {
    const name = this.optionText('catalyst');
    return name.charAt(0).toLocaleUpperCase(this.languageTag) + name.slice(1);
  }

  protected plain(key: string): string {
    const shown = this.reading(key)?.shown;
    return shown === undefined ? '–' : this.number(shown.replace(/\.0+$/, ''));
  }

  /** What an amount is counted on. */
  protected how({ what }: ChargeLine, step: ChargeStep): unknown {
    const { charge } = this.texts;
    if (what === 'catalyst') return this.catalystParts();
    if (what === 'methanol' && step.step === 'base') {
      const brought = `${this.looked}.methanolFromCatalyst`;
      const credit = this.aboveZero(brought);
      const enough = Number(this.reading(`${this.looked}.methanol`)?.value ?? 1) === 0;
      return html`${fill(charge.methanolBasis.base, { ratio: this.plain('methanolRatio') })}
      ${credit ? html`<br />${fill(enough ? charge.methanolExceeds : charge.methanolCredit, { mass: this.amountWords(brought) ?? '' })}` : nothing}`;
    }
    if (what === 'methanol') {
      const basis = this.option('pretreatmentMethanolBasis') as keyof typeof charge.methanolBasis;
      const ratio = this.plain(METHANOL_FIGURE[basis]?.key ?? `pass${step.pass}.methanolRule`);
      return fill(charge.methanolBasis[basis], { ratio });
    }
    if (what === 'sulfuric-acid') {
      const basis = this.option('pretreatmentAcidBasis') as keyof typeof charge.acidBasis;
      return fill(charge.acidBasis[basis], { share: this.plain(ACID_FIGURE[basis]?.key ?? `pass${step.pass}.acidRule`) });
    }
    return nothing;
  }

  private catalystParts(): unknown {
    const { charge } = this.texts;
    const { looked } = this;
    const mineral = this.aboveZero(`${looked}.mineralPure`);
    const per = { perLitre: this.plain(`${looked}.catalystPerLitre`), perKilogram: this.plain(`${looked}.catalystPerKilogram`) };
    const parts = fillWith(charge.parts, { base: this.figure(`${looked}.baseProduct`), extra: this.figure(`${looked}.extraProduct`) });
    return html`${parts}
    ${mineral ? html`<br />${fillWith(charge.mineral, { mass: this.figure(`${looked}.mineralProduct`) })}` : nothing}
    <br />${fill(charge.perLitre, per)}`;
  }
}
