import { html, nothing } from 'lit';
import { state } from 'lit/decorators.js';
import type { RouteName } from '../../chemistry/route-name.js';
import type { ChargeLine, ChargeStep } from '../../decision/charge.js';
import type { Verdict } from '../../decision/route.js';
import { fill } from '../../locales/fill.js';
import { chooseStyles } from '../parts/choose-styles.js';
import { ACID_FIGURE, ChargeLines, METHANOL_FIGURE } from './charge-lines.js';
import { chargeStyles } from './charge-styles.js';

const after = (): unknown => html`<esterway-after bare exportparts="figure, caution, field-line, field-input"></esterway-after>`;
const balance = (): unknown => html`<esterway-balance bare exportparts="figure, flow"></esterway-balance>`;
const cost = (): unknown => html`<esterway-cost bare exportparts="figure, field-line, field-input"></esterway-cost>`;
const overTime = (): unknown => html`<esterway-residual></esterway-residual>`;

/** What must be known for the steps to be shown. A retest that cannot be used yet takes none of its own fields away. */
const FIRST_AMOUNT = { direct: 'direct.catalyst', twoStep: 'pass1.sulfuric' } as const;

/**
 * The charge of a lot: what to weigh, in order of addition, for either route, with base and extra
 * catalyst apart, the cautions at the step they belong to, and the retest between the two steps.
 *
 * @element esterway-charge
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 * @fires {EsterwayChangeEvent} esterway-change - a person changed the lot (only where the element holds it itself)
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart step - a step with its amounts
 * @csspart caution - the cautions of a step
 * @csspart figure - a figure that opens its working
 *
 * @cssprop --esterway-amber - headings of steps and cautions
 * @cssprop --esterway-pink-soft - behind the retest
 */
export class EsterwayCharge extends ChargeLines {
  static override styles = [...ChargeLines.styles, chooseStyles, chargeStyles];

  /** The route looked at, where a person has chosen one; else the one recommended. */
  @state() private chosen: RouteName | undefined;
  /** The lot and the verdict it was chosen for. */
  #chosenFor = '';

  /** The route that is shown: the one that follows for the lot, unless a person looked at the other. */
  override get looked(): RouteName {
    return this.chosen ?? this.recommended;
  }

  /** A choice stands for one lot and one verdict. */
  protected override willUpdate(): void {
    super.willUpdate();
    const about = this.lot ? `${this.lot.route.verdict} ${this.desk.entry.name ?? ''}` : '';
    if (about !== this.#chosenFor) this.chosen = undefined;
    this.#chosenFor = about;
  }

  protected override get heading(): string {
    return this.texts.sections.charge;
  }

  protected override get summary(): string {
    const mass = this.amountWords('oilMass');
    const volume = this.amountWords('oilVolume');
    const temperature = this.amountWords('oilTemperature');
    return mass && volume && temperature ? fill(this.texts.charge.batch, { mass, volume, temperature }) : '';
  }

  protected override body(): unknown {
    const { texts, lot } = this;
    if (!lot) return nothing;
    const steps = lot.charges[this.looked];
    return html`
      <div class="choose no-print" role="radiogroup" aria-label=${texts.charge.choose}>
        ${this.radio('direct', texts.charge.direct)} ${this.radio('twoStep', texts.charge.twoStep)}
      </div>
      ${this.gate(lot.route.verdict)} ${this.reagents()}
      ${this.known(`${this.looked}.catalyst`) ? nothing : html`<p class="quiet small">${this.whyUnknown(`${this.looked}.catalyst`)}</p>`}
      ${this.noticesAt((field) => (this.looked === 'twoStep' && field === 'pass1.batchVolume') || field.startsWith(`${this.looked}.`))}
      ${this.known(FIRST_AMOUNT[this.looked]) ? html`${steps.map((step) => this.step(step, steps))} ${this.outcome()}` : nothing}
      <esterway-later .label=${texts.charge.after} .content=${after}></esterway-later>
      <esterway-later .label=${texts.charge.balance} .content=${balance}></esterway-later>
      <esterway-later .label=${texts.charge.cost} .content=${cost}></esterway-later>
    `;
  }

  /** A charge that is not what the verdict says stands under the verdict. */
  private gate(verdict: Verdict): unknown {
    const { texts, looked, recommended } = this;
    const neither = verdict === 'outside' || verdict === 'no-acid-step';
    if (!neither && (looked === recommended || verdict === 'not-known')) return nothing;
    return html`<p class="gate small">${neither ? nothing : texts.charge.notThisRoute} ${texts.verdicts[verdict]}.</p>`;
  }

  /** What the charge is worked out with: the site's, unless this lot is charged otherwise. */
  private reagents(): unknown {
    const acidStep = this.looked === 'twoStep';
    const temperatures = this.desk.units === 'us' ? ['°F', '°C'] : ['°C', '°F'];
    const words = [this.optionText('catalyst'), fill(this.texts.charge.methanolBasis.base, { ratio: this.plain('methanolRatio') })];
    return html`
      <details class="no-print">
        <summary>${words.join(' · ')}</summary>
        <div class="fields">
          ${this.optionField('catalyst', true)} ${this.figureField(`${this.option('catalyst')}.baseLoad`, ['%'])}
          ${this.figureField(`${this.option('catalyst')}.assay`, ['%'])} ${this.figureField('methanolRatio', ['mol/mol'])}
          ${this.figureField('methanolAssay', ['%'])} ${this.figureField('methanolTemperature', temperatures)}
          ${acidStep ? this.acidStepReagents(temperatures) : nothing}
        </div>
      </details>
    `;
  }

  private acidStepReagents(temperatures: readonly string[]): unknown {
    const methanol = METHANOL_FIGURE[this.option('pretreatmentMethanolBasis')];
    const acid = ACID_FIGURE[this.option('pretreatmentAcidBasis')];
    return html`
      ${this.optionField('pretreatmentMethanolBasis', true)} ${methanol ? this.figureField(methanol.key, [methanol.unit]) : nothing}
      ${this.optionField('pretreatmentAcidBasis', true)} ${acid ? this.figureField(acid.key, [acid.unit]) : nothing}
      ${this.figureField('sulfuricAssay', ['%'])} ${this.figureField('pretreatmentTemperature', temperatures)}
      ${this.figureField('pretreatmentTime', ['min', 'h'])}
    `;
  }

  private radio(route: RouteName, words: string): unknown {
    return html`<label
      ><input type="radio" name="route" .checked=${this.looked === route} @change=${() => (this.chosen = route)} /><span>${words}</span></label
    >`;
  }

  private step(step: ChargeStep, all: readonly ChargeStep[]): unknown {
    const { texts, looked } = this;
    const title = this.titleOf(step, all);
    const resting = step.step === 'base' && looked === 'twoStep' ? (this.hasRetest ? texts.charge.onRetest : texts.charge.onEstimate) : '';
    const weighed = step.lines.filter(({ what }) => what !== 'retest');
    const retest = step.lines.some(({ what }) => what === 'retest');
    return html`
      <div part="step" role="group" aria-label=${title}>
        <h3>${title}${resting ? html` <span class="unit">${resting}</span>` : nothing}</h3>
        <ol>
          ${weighed.map((line) => this.line(line, step))}
        </ol>
        ${this.cautions(step)} ${retest ? this.retest() : nothing}
      </div>
    `;
  }

  private line(line: ChargeLine, step: ChargeStep): unknown {
    if (!line.mass) return html`<li><span class="plain">${this.instruction(line)}</span></li>`;
    const how = html`${this.how(line, step)}${this.dispensed(line, step)}`;
    const volume = line.volume && this.aboveZero(line.volume) ? this.figure(line.volume) : nothing;
    return html`<li>
      <span class="what">${this.instruction(line, step)}</span><span class="mass">${this.figure(line.mass)}</span>
      <span class="how">${how}</span><span class="volume">${volume}${this.spread(line.mass)}</span>
    </li>`;
  }

  private cautions(step: ChargeStep): unknown {
    const { cautions } = this.texts;
    return html`<div class="care" part="caution" role="note">
      <b>${cautions.title}</b>
      <ul>
        ${step.cautions.map((code) => html`<li>${cautions[code]}</li>`)}
      </ul>
    </div>`;
  }

  /** Between the two steps: what to expect, and the titration that replaces the expectation. */
  private retest(): unknown {
    const { charge } = this.texts;
    const low = this.reading('pretreated.ffaLeft.fast')?.shown;
    const high = this.reading('pretreated.ffaLeft.slow')?.shown;
    return html`
      <div class="gate">
        <b>${charge.forRun.retest}</b>
        ${low !== undefined && high !== undefined ? html`<p>${fill(charge.expected, { low: this.smallShare(low), high: this.number(high) })}</p>` : nothing}
        <esterway-later .label=${charge.overTime} .content=${overTime}></esterway-later>
        <esterway-titration bare retest exportparts="figure, result"></esterway-titration>
      </div>
    `;
  }

  /** A share too small for its two decimals is not nothing. */
  private smallShare(shown: string): string {
    return /^0\.0+$/.test(shown) ? fill(this.texts.charge.belowShown, { least: this.number(shown.replace(/0$/, '1')) }) : this.number(shown);
  }

  private outcome(): unknown {
    const { charge } = this.texts;
    const { looked } = this;
    if (this.reading(`${looked}.soap`)?.value === undefined) return nothing;
    return html`
      <h3>${charge.outcome}</h3>
      <dl>
        <dt>${charge.waterOf}</dt>
        <dd>${this.figure(`${looked}.waterShare`)}</dd>
        <dt>${charge.soapOf}</dt>
        <dd>${this.figure(`${looked}.soap`)} <span class="quiet">${this.figure(`${looked}.soapShare`)}</span></dd>
        <dt>${charge.lostOf}</dt>
        <dd>${this.figure(`${looked}.oilLost`)}</dd>
        <dt>${fill(charge.esterOf, { conversion: this.plain('conversion') })}</dt>
        <dd>${this.figure(`${looked}.ester`)}</dd>
        <dt>${charge.glycerolOf}</dt>
        <dd>${this.figure(`${looked}.glycerol`)}</dd>
      </dl>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-charge': EsterwayCharge;
  }
}
