import { css, html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { state } from 'lit/decorators.js';
import { COMPONENTS } from '../../chemistry/balance-steps.js';
import type { Component, Stream } from '../../chemistry/balance-steps.js';
import type { RouteName } from '../../chemistry/route-name.js';
import { Decimal } from '../../formula/decimal.js';
import { deBalanceQuantities } from '../../locales/de-balance-quantities.js';
import { deBalance } from '../../locales/de-balance.js';
import { de } from '../../locales/de.js';
import { enBalanceQuantities } from '../../locales/en-balance-quantities.js';
import { enBalance } from '../../locales/en-balance.js';
import { en } from '../../locales/en.js';
import { fill } from '../../locales/fill.js';
import { addQuantityNames } from '../../locales/quantity-name.js';
import { balance } from '../../lot/balance.js';
import type { Balance, BalanceFlow, BalanceStep } from '../../lot/balance.js';
import { chooseStyles } from '../parts/choose-styles.js';
import { FurtherReadings } from '../parts/further-readings.js';
import { WIDTH, flowDiagram, flowStyles, heightOf, placed } from './flow-diagram.js';
import type { FlowRow } from './flow-diagram.js';
import { tableStyles } from './table-styles.js';

const TEXTS = { en: enBalance, de: deBalance };
const ROUTES = ['direct', 'twoStep'] as const;
/** What is told of a figure even where it is the only one of its substance: which layer it is in. */
const LAYERS: readonly Stream[] = ['drawnOff', 'esterLayer', 'glycerolLayer'];

/**
 * The mass balance of the batch: everything that goes into a step and comes out of it, as a flow from
 * top to bottom and as a table that says the same, with the layers by mass and volume.
 *
 * @element esterway-balance
 * @attr {boolean} folded - folds the section to its one-line summary
 * @attr {boolean} bare - leaves the heading out
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out
 *
 * @csspart section - the whole section
 * @csspart heading - the button that folds it
 * @csspart body - what is folded away
 * @csspart flow - the flow from top to bottom
 * @csspart figure - a figure that opens its working
 */
export class EsterwayBalance extends FurtherReadings {
  static override styles = [
    ...FurtherReadings.styles, chooseStyles, flowStyles, tableStyles,
    css`
      p {
        margin-block: 6px;
      }
    `,
  ];

  /** The route looked at, where a person has chosen one; else the one recommended. */
  @state() private chosen: RouteName | undefined;
  /** The lot and the verdict it was chosen for. */
  #chosenFor = '';
  /** The balances that are known. */
  #found: Partial<Record<RouteName, Balance>> = {};

  protected override get heading(): string {
    return this.textsOf(TEXTS).title;
  }

  protected override get further(): readonly string[] {
    const { entry, site } = this.desk;
    // the words come with the figures
    addQuantityNames(en, enBalanceQuantities);
    addQuantityNames(de, deBalanceQuantities);
    const found = ROUTES.map((route) => balance(entry, site, route));
    this.#found = Object.fromEntries(found.flatMap((one) => ('steps' in one ? [[one.route, one]] : [])));
    return [...new Set([...ROUTES.map(lastOf), 'oilMass', ...Object.values(this.#found).flatMap(({ steps }) => steps.flatMap(keysOf))])];
  }

  /** A choice stands for one lot and one verdict. */
  protected override willUpdate(): void {
    super.willUpdate();
    const about = this.lot ? `${this.lot.route.verdict} ${this.desk.entry.name ?? ''}` : '';
    if (about !== this.#chosenFor) this.chosen = undefined;
    this.#chosenFor = about;
  }

  private get looked(): RouteName {
    return this.chosen ?? this.recommended;
  }

  protected override body(): unknown {
    const { charge } = this.texts;
    const found = this.#found[this.looked];
    const both = ROUTES.every((route) => this.#found[route]);
    return html`
      ${both
        ? html`<div class="choose no-print" role="radiogroup" aria-label=${charge.choose}>${this.radio('direct', charge.direct)} ${this.radio('twoStep', charge.twoStep)}</div>`
        : nothing}
      ${found ? html`${this.flow(found)} ${this.notes(found)} <div class="steps">${found.steps.map((step) => this.step(step, found))}</div>` : html`<p class="quiet">${this.whyUnknown(lastOf(this.looked))}</p>`}
    `;
  }

  private radio(route: RouteName, words: string): unknown {
    return html`<label
      ><input type="radio" name="route" .checked=${this.looked === route} @change=${() => (this.chosen = route)} /><span>${words}</span></label
    >`;
  }

  private notes({ steps }: Balance): unknown {
    const texts = this.textsOf(TEXTS);
    const acidStep = steps.some(({ step }) => step === 'pass1');
    return html`<p class="quiet small">${acidStep ? texts.cautious : nothing} ${texts.catalyst} ${texts.volumes}</p>`;
  }

  // -- the flow ---------------------------------------------------------------

  private flow(found: Balance): TemplateResult {
    const rows = placed(this.rows(found));
    const last = found.steps.at(-1)?.layers ?? [];
    const massOf = (stream: Stream): string => this.amountWords(last.find((layer) => layer.stream === stream)?.key ?? '') ?? '';
    const label = fill(this.textsOf(TEXTS).label, { oil: this.amountWords('oilMass') ?? '', ester: massOf('esterLayer'), glycerol: massOf('glycerolLayer') });
    return html`<svg class="flow" part="flow" viewBox="0 0 ${WIDTH} ${heightOf(rows)}" role="img" aria-label=${label}>${flowDiagram(rows)}</svg>`;
  }

  /** What comes in and leaves, in the order in which it does. What weighs nothing is left out. */
  private rows(found: Balance): readonly FlowRow[] {
    const { streams, places } = this.textsOf(TEXTS);
    const row = (kind: FlowRow['kind'], stream: Stream, { key, mass }: { key: string; mass: string }): readonly FlowRow[] =>
      Number(mass) > 0 ? [{ kind, name: stream === 'neutralisingAcid' ? places[stream] : streams[stream], amount: this.amountWords(key) ?? '', mass: Number(mass) }] : [];
    const start = this.reading('oilMass')?.value ?? '0';
    return [
      ...row('start', 'oil', { key: 'oilMass', mass: start }),
      ...found.steps.flatMap((step) => [
        ...step.charged.flatMap((charged) => row('in', charged.stream, charged)),
        { kind: 'step', name: this.nameOf(step, found) } as const,
        ...step.layers.filter(({ stream }) => stream === 'drawnOff' || stream === 'glycerolLayer').flatMap((layer) => row('out', layer.stream, layer)),
        ...step.layers.filter(({ stream }) => stream === 'esterLayer').flatMap((layer) => row('end', layer.stream, layer)),
      ]),
    ];
  }

  private nameOf({ step }: BalanceStep, { steps }: Balance): string {
    const texts = this.textsOf(TEXTS).steps;
    if (step === 'retest' || step === 'react' || step === 'settle') return texts[step];
    return steps.some((other) => other.step === 'pass2') ? fill(texts.passOf, { n: step.slice('pass'.length) }) : texts.pass;
  }

  // -- the table --------------------------------------------------------------

  private step(step: BalanceStep, found: Balance): TemplateResult {
    const texts = this.textsOf(TEXTS);
    const retest = step.step === 'retest';
    const there = COMPONENTS.filter((component) => [...step.in, ...step.out].some((flow) => flow.component === component && !isNothing(flow)));
    return html`<div>
      <table>
        <caption>${this.nameOf(step, found)}</caption>
        <thead><tr><th scope="col">${texts.substance}</th><th scope="col">${retest ? texts.predicted : texts.in}</th><th scope="col">${retest ? texts.counted : texts.out}</th></tr></thead>
        <tbody>${there.map((component) => html`<tr><th scope="row">${texts.components[component]}</th>${this.cell(step.in, component)}${this.cell(step.out, component)}</tr>`)}</tbody>
        <tfoot>
          <tr><th scope="row">${texts.total}</th><td>${this.figure(step.totals.in.key)}</td><td>${this.figure(step.totals.out.key)}</td></tr>
          <tr><th scope="row" colspan="2">${retest ? texts.changed : texts.difference}</th><td>${this.figure(step.difference.key)}</td></tr>
        </tfoot>
      </table>
      ${retest ? html`<p class="quiet small">${texts.retested}</p>` : nothing} ${step.layers.length ? this.layers(step) : nothing}
    </div>`;
  }

  /** How much of a substance, stream by stream. */
  private cell(flows: readonly BalanceFlow[], component: Component): TemplateResult {
    const { places } = this.textsOf(TEXTS);
    const there = flows.filter((flow) => flow.component === component && !isNothing(flow));
    const told = (stream: Stream): boolean => there.length > 1 || LAYERS.includes(stream);
    return html`<td>${there.length
      ? there.map(({ key, stream }) => html`<div>${this.figure(key)}${told(stream) ? html`<span class="stream">${places[stream]}</span>` : nothing}</div>`)
      : '–'}</td>`;
  }

  private layers({ layers }: BalanceStep): TemplateResult {
    const { streams, places, ofLayer } = this.textsOf(TEXTS);
    const name = (stream: Stream): string => (stream.endsWith('Layer') ? fill(ofLayer, { layer: streams[stream], place: places[stream] }) : streams[stream]);
    return html`<dl>${layers.map(({ stream, key, volumeKey }) => html`<dt>${name(stream)}</dt><dd>${this.figure(key)}</dd><dd>${this.figure(volumeKey)}</dd>`)}</dl>`;
  }
}

/** The figure that a route's balance ends with: why there is none is why there is no balance. */
const lastOf = (route: RouteName): string => `balance.${route}.settlingOut`;

const isNothing = ({ mass }: { readonly mass: string }): boolean => new Decimal(mass).isZero();

const keysOf = ({ in: into, out, charged, layers, totals, difference }: BalanceStep): readonly string[] =>
  [...into, ...out, ...charged, ...layers, totals.in, totals.out, difference].map(({ key }) => key).concat(layers.map(({ volumeKey }) => volumeKey));

declare global {
  interface HTMLElementTagNameMap {
    'esterway-balance': EsterwayBalance;
  }
}
