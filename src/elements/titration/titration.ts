import { css, html, nothing } from 'lit';
import { property } from 'lit/decorators.js';
import type { RunList } from '../../lot/keys.js';
import { fill } from '../../locales/fill.js';
import { SectionElement } from '../parts/section.js';
import { RunsTable } from './runs-table.js';

/** Fields whose remarks stand under the result. */
const TITRATED = /^(?:run\d+\.|acidValue$|titrantStrength$|titrantDate$|khpPurity$|blank$|titrationTemperature$|referenceAcid$)/;
const planning = (): unknown => html`<esterway-plan bare></esterway-plan>`;

/** Units offered for each figure of the bench. */
const STRENGTH_UNITS = ['mol/L', 'g/L'];
const TEMPERATURE_UNITS = { metric: ['°C', '°F'], us: ['°F', '°C'] } as const;

/**
 * The titration of a lot: how it was done, the runs, and the acid value and free fatty acid that
 * follow. A form field: its value is the free fatty acid in per cent, as decimal text with a point.
 *
 * @element esterway-titration
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 * @attr {boolean} retest - the titration after the acid step, in place of that of the oil as it came
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 * @attr {string} name - name of the form field
 * @attr {boolean} required - makes the form field invalid until its value is known
 *
 * @fires {EsterwayChangeEvent} esterway-change - a person changed the lot (only where the element holds it itself)
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart result - the two results
 * @csspart figure - a figure that opens its working
 * @csspart field-line - the ruled line of a field
 * @csspart field-input - the input of a field
 *
 * @cssprop --esterway-paper - background
 * @cssprop --esterway-ink - text
 * @cssprop --esterway-quiet - labels and units
 * @cssprop --esterway-glass - lines of fields and buttons
 * @cssprop --esterway-pink - what is live or asks for attention
 * @cssprop --esterway-amber - headings of steps and cautions
 * @cssprop --esterway-font - font family
 * @cssprop --esterway-font-size - size of plain text; everything else follows
 */
export class EsterwayTitration extends SectionElement {
  static readonly formAssociated = true;
  static override shadowRootOptions: ShadowRootInit = { mode: 'open', delegatesFocus: true };
  static override styles = [
    ...SectionElement.styles,
    RunsTable.styles,
    css`
      .result {
        display: grid;
        grid-template-columns: 1fr 1fr;
        gap: 0 12px;
        margin-block-start: 12px;
      }
      .result > div {
        border-block-start: 1.5px solid var(--_ink);
        padding-block-start: 4px;
      }
      .value {
        font-size: 1.65em;
        font-weight: 600;
        line-height: 1.15;
      }
      .value .unit {
        font-size: 0.55em;
      }
      .spread {
        font-variant-numeric: tabular-nums;
      }
      .kind {
        color: var(--_quiet);
        font-size: 0.9em;
      }
      .note {
        margin-block-start: 6px;
        color: var(--_quiet);
        font-size: 0.92em;
      }
      details {
        margin-block-end: 6px;
      }
    `,
  ];

  @property({ type: Boolean, reflect: true }) retest = false;
  @property({ type: Boolean, reflect: true }) required = false;

  readonly #internals: ElementInternals | undefined;
  readonly #table = new RunsTable(this, {
    runs: () => this.desk.entry[this.list],
    texts: () => this.texts,
    tag: () => this.languageTag,
    figure: (key) => this.figure(key, false),
    problemAt: (field) => this.problemAt(field),
    edit: (edit) => this.edit(edit),
  });

  constructor() {
    super();
    // absent where the class is only imported, as on a server
    this.#internals = typeof this.attachInternals === 'function' ? this.attachInternals() : undefined;
  }

  /** Free fatty acid in per cent as reported, decimal text; empty while it is not known. */
  get value(): string {
    return this.reading(`${this.keyPrefix}freeFattyAcid`)?.shown ?? '';
  }

  /** The form this field belongs to. */
  get form(): HTMLFormElement | null {
    return this.#internals?.form ?? null;
  }

  formResetCallback(): void {
    if (this.holdsLot) this.holder.reset();
  }

  private get keyPrefix(): '' | 'retest.' {
    return this.retest ? 'retest.' : '';
  }

  private get list(): Exclude<RunList, 'titrantRuns'> {
    return this.retest ? 'retestRuns' : 'runs';
  }

  protected override get heading(): string {
    return this.retest ? this.texts.charge.retestTitle : this.texts.sections.titration;
  }

  protected override get summary(): string {
    const ffa = this.amountWords(`${this.keyPrefix}freeFattyAcid`);
    const acidValue = this.amountWords(`${this.keyPrefix}acidValue`);
    const strength = this.retest ? undefined : this.amountWords('titrantMolarity') ?? this.amountWords('titrantMassStrength');
    if (this.folded) return ffa && acidValue ? `${this.texts.runs.acidValue} ${acidValue} · FFA ${ffa}` : this.texts.result.notKnown;
    return strength ? `${this.optionText('titrantAlkali')} ${strength}` : '';
  }

  protected override body(): unknown {
    const from = this.option(`${this.keyPrefix}acidKnownFrom`);
    return html`
      ${this.method(from)}
      <div class="fields">
        ${from === 'certificate-acid-value' ? this.figureField(`${this.keyPrefix}certificateAcidValue`, ['mg/g']) : nothing}
        ${from === 'certificate-ffa' ? this.figureField(`${this.keyPrefix}certificateFfa`, ['%']) : nothing}
        ${from === 'titration' && !this.retest ? this.strengthAndBlank() : nothing}
      </div>
      ${from === 'titration' ? this.#table.render(this.list, this.option('sampleTakenBy') === 'volume' ? 'mL' : 'g') : nothing}
      ${this.results()} ${from === 'titration' ? this.bench() : nothing}
    `;
  }

  /** How the acidity is found: changes seldom, so it is folded to a line. */
  private method(from: string): unknown {
    const temperatures = TEMPERATURE_UNITS[this.desk.units];
    const titrated = from === 'titration';
    const by = `${this.keyPrefix}acidKnownFrom`;
    if (this.retest) return html`<div class="fields">${this.optionField(by, true)}</div>`;
    const words = titrated ? [this.optionText(by), this.optionText('titrantAlkali'), this.optionText('sampleTakenBy'), this.optionText('blankPolicy')] : [this.optionText(by)];
    return html`
      <details class="no-print">
        <summary>${words.join(' · ')}</summary>
        <div class="fields">
          ${this.optionField(by, true)}
          ${titrated ? html`${this.optionField('titrantAlkali')} ${this.optionField('titrantSolvent')} ${this.optionField('blankPolicy', true)} ${this.optionField('sampleTakenBy')}` : nothing}
          ${titrated && this.option('sampleTakenBy') === 'volume' ? this.figureField('sampleDensity', ['g/mL', 'kg/m³']) : nothing}
          ${this.optionField('referenceAcid')} ${this.option('referenceAcid') === 'other' ? this.figureField('otherAcidMolarMass', ['g/mol']) : nothing}
          ${titrated ? html`${this.figureField('titrationTemperature', temperatures)} ${this.figureField('standardisationTemperature', temperatures)}` : nothing}
        </div>
      </details>
    `;
  }

  /** A blank typed beside neutralised solvent stays in sight, with what is wrong about it. */
  private strengthAndBlank(): unknown {
    const blankMatters = this.option('blankPolicy') === 'blank-subtracted' || 'blank' in this.desk.entry.figures;
    const ofSite = !('titrantStrength' in this.desk.entry.figures) && this.option('titrantKnownFrom') !== 'label';
    const strength = this.figureField('titrantStrength', STRENGTH_UNITS, ofSite ? this.texts.titrant.ownStrength : undefined);
    return html`${ofSite ? html`<p class="wide">${this.texts.titrant.ofSite}: ${this.figure('titrantConcentration')} ${this.plusMinus('titrantConcentration')}</p>` : nothing} ${strength} ${blankMatters ? this.figureField('blank', ['mL']) : nothing}`;
  }

  /** The site's titrant, to standardise where the titration is done; a plan for the next; the end point from a recorded curve. */
  private bench(): unknown {
    const { titrant, sections } = this.texts;
    const standard = (): unknown => html`<esterway-titrant bare exportparts="result, figure, field-line, field-input"></esterway-titrant>`;
    const curve = (): unknown => html`<esterway-curve bare ?retest=${this.retest} exportparts="result, action, field-line, field-input"></esterway-curve>`;
    const reading = html`<esterway-later .label=${this.texts.runs.curve} .content=${curve}></esterway-later>`;
    if (this.retest) return reading;
    return html`
      <esterway-later .label=${`${sections.titrant} · ${this.optionText('titrantKnownFrom')}`} .content=${standard}></esterway-later>
      <esterway-later .label=${titrant.plan} .content=${planning}></esterway-later>
      ${reading}
    `;
  }

  private results(): unknown {
    const { texts, keyPrefix: prefix } = this;
    const acid = this.optionText('referenceAcid');
    return html`
      <div class="result" part="result" role="status">
        <div>
          <div class="value">${this.figure(`${prefix}acidValue`)}</div>
          <div class="spread">${this.plusMinus(`${prefix}acidValue`)}</div>
          <div class="kind">${texts.result.acidValue}</div>
        </div>
        <div>
          <div class="value">${this.figure(`${prefix}freeFattyAcid`)}</div>
          <div class="spread">${this.plusMinus(`${prefix}freeFattyAcid`)}</div>
          <div class="kind">${fill(texts.result.ffa, { acid })}</div>
        </div>
      </div>
      <p class=${this.lot?.replicates[this.retest ? 'retest' : 'lot'].state === 'differ' ? 'gate' : 'note'}>${this.remark()}</p>
      ${prefix || !this.reading('alkaliPerLitreOfOil')?.value
        ? nothing
        : html`<p class="note">${this.figure('alkaliPerLitreOfOil')} ${fill(texts.result.alkali, { alkali: this.optionText('titrantAlkali') })}</p>`}
      ${this.noticesAt((field) => (prefix ? field.startsWith(prefix) : TITRATED.test(field)))}
    `;
  }

  /** How the result came about, or what it still waits for. */
  private remark(): string {
    const { texts, keyPrefix: prefix } = this;
    const key = `${prefix}acidValue`;
    if (this.reading(key)?.value === undefined) {
      if (this.retest && !this.desk.entry.retestRuns.length) return texts.charge.retestNone;
      return this.whyUnknown(key);
    }
    if (this.option(`${prefix}acidKnownFrom`) !== 'titration') return texts.result.certificate;
    const incomplete = (this.lot?.[this.list] ?? []).indexOf('incomplete');
    return [
      this.made(),
      incomplete >= 0 ? fill(texts.notices['run-incomplete'], { run: String(incomplete + 1) }) : '',
      this.lot?.uncertainties[key] ? texts.result.plusMinusNote : '',
    ].join(' ').trim();
  }

  /** What was made of the runs, and the next step. */
  private made(): string {
    const { texts } = this;
    const judged = this.lot?.replicates[this.retest ? 'retest' : 'lot'];
    if (!judged || judged.state === 'none') return '';
    const next = judged.next === 'nothing' ? '' : texts.replicates.next[judged.next];
    if (judged.state === 'one') return `${texts.notices['one-run']} ${next}`;
    const sentence = judged.state === 'agree' ? texts.replicates.agree : judged.average === 'mean' ? texts.replicates.differMean : texts.replicates.differMedian;
    const figure = (key: string): string => this.number(this.reading(`${this.keyPrefix}${key}`)?.shown ?? '–');
    return `${fill(sentence, { runs: String(judged.runs), range: figure('runRange'), critical: figure('criticalRange') })} ${next}`;
  }

  protected override updated(): void {
    this.#internals?.setFormValue(this.value || null, JSON.stringify(this.desk.entry));
    const anchor = this.shadowRoot?.querySelector<HTMLElement>('esterway-figure');
    const problem = this.lot?.problems[0];
    if (problem) this.#internals?.setValidity({ customError: true }, this.problemText(problem), anchor ?? undefined);
    else if (!this.value && this.required) this.#internals?.setValidity({ valueMissing: true }, this.whyUnknown(`${this.keyPrefix}acidValue`), anchor ?? undefined);
    else this.#internals?.setValidity({});
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-titration': EsterwayTitration;
  }
}
