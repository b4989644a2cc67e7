import { css, html, nothing } from 'lit';
import type { CSSResult, ReactiveController, ReactiveControllerHost, TemplateResult } from 'lit';
import { probabilityBelow } from '../../decision/guard.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import type { Interval } from '../../formula/sampled.js';
import { fill } from '../../locales/fill.js';
import type { Widened } from '../../locales/en.js';
import type { enMonteCarlo } from '../../locales/en-monte-carlo.js';
import type { LotEntry, SiteProfile } from '../../lot/entry.js';
import { lotRun } from '../../lot/lot-run.js';
import { checkFirstOrder } from '../../lot/monte-carlo-check.js';
import type { FirstOrderCheck } from '../../lot/monte-carlo-check.js';
import { USUAL_DRAWS } from '../../lot/monte-carlo.js';
import type { MonteCarlo, MonteCarloOrder, Simulated } from '../../lot/monte-carlo.js';
import { uncertaintyOf } from '../../lot/uncertainty.js';
import { drawInPage, drawInWorker } from '../parts/monte-carlo-run.js';
import type { Running } from '../parts/sliced-work.js';
import { plotStyles } from '../parts/plot.js';
import { histogram, histogramStyles } from './histogram.js';

type MonteCarloTexts = Widened<typeof enMonteCarlo>;

/** What the check needs of the section around it. */
export interface MonteCarloHost {
  entry(): LotEntry;
  site(): SiteProfile;
  texts(): MonteCarloTexts;
  /** Canonical decimal text in the page's language. */
  number(text: string): string;
}

/** Both ways of the same result. */
interface Outcome {
  readonly value: Decimal;
  readonly u: Decimal;
  readonly unit: string;
  readonly seed: number;
  readonly draws: number;
  readonly simulated: Simulated;
  readonly check: FirstOrderCheck;
}

type State =
  | { readonly is: 'idle' | 'no-worker' | 'not-known' }
  | { readonly is: 'running'; readonly done: number }
  | { readonly is: 'failed'; readonly error: string }
  | { readonly is: 'done'; readonly outcome: Outcome };

/** Checks the uncertainty of a result by Monte Carlo, when asked to: beside the page, or in it where the page allows no worker. */
export class MonteCarloCheck implements ReactiveController {
  static readonly styles: readonly CSSResult[] = [
    plotStyles,
    histogramStyles,
    css`
      .check {
        margin-block: 8px;
        line-height: 1.4;
      }
      .check p:not(.gate) {
        margin-block: 6px;
      }
      .check progress {
        display: block;
        inline-size: 100%;
        max-inline-size: 26em;
        margin-block: 6px 2px;
        accent-color: var(--_glass);
      }
      .ways {
        table-layout: fixed;
        inline-size: 100%;
        margin-block-start: 8px;
        border-collapse: collapse;
      }
      .ways th,
      .ways td {
        padding-block: 3px;
        padding-inline: 0;
        vertical-align: baseline;
      }
      .ways th {
        color: var(--_quiet);
        font-weight: 400;
        font-size: 0.9em;
        text-align: start;
      }
      .ways td,
      .ways thead th {
        padding-inline-start: 6px;
        text-align: end;
      }
      .ways tbody tr {
        border-block-start: 1px solid var(--_rule);
      }
      .check svg,
      .ways {
        break-inside: avoid;
      }
    `,
  ];

  readonly #element: ReactiveControllerHost;
  readonly #host: MonteCarloHost;
  #state: State = { is: 'idle' };
  #drawing: Running | undefined;
  #seed = 0;
  /** What the state is about: it is void when any of the three is another. */
  #about: readonly [key: string, entry: LotEntry, site: SiteProfile] | undefined;

  constructor(element: ReactiveControllerHost, host: MonteCarloHost) {
    this.#element = element;
    this.#host = host;
    element.addController(this);
  }

  hostDisconnected(): void {
    this.#about = undefined;
    this.#drawing?.stop();
  }

  render(key: string): TemplateResult {
    this.#follow(key);
    const texts = this.#host.texts();
    const state = this.#state;
    // always the same button, so that the focus stays when its words change
    const words = { idle: texts.start, running: texts.stop, done: texts.again, failed: texts.again, 'not-known': texts.start, 'no-worker': texts.inPage }[state.is];
    const act = (): void => (state.is === 'running' ? this.#stop() : this.#start(key, state.is === 'no-worker' ? drawInPage : drawInWorker));
    return html`
      <div class="check">
        <button class="action no-print" type="button" @click=${act}>${words}</button>
        <div role="status">${this.#message(state)}</div>
        ${state.is === 'running' ? this.#progress(state.done) : nothing} ${state.is === 'done' ? this.#outcome(state.outcome) : nothing}
      </div>
    `;
  }

  /** What there is to say, in an element that stays: what appears in it is read out. */
  #message(state: State): TemplateResult | typeof nothing {
    const texts = this.#host.texts();
    const gate = (text: string): TemplateResult => html`<p class="gate">${text}</p>`;
    switch (state.is) {
      case 'no-worker':
        return gate(texts.noWorker);
      case 'not-known':
        return gate(texts.notKnown);
      case 'failed':
        return gate(fill(texts.failed, { error: state.error }));
      case 'done': {
        const { check, unit } = state.outcome;
        const [apart, tolerance] = [check.apart, check.tolerance].map((figure) => withUnit(this.#significant(figure, 1), unit)) as [string, string];
        const text = fill(texts.verdicts[check.verdict], { apart, tolerance });
        return check.verdict === 'differs' ? gate(text) : html`<p>${text}</p>`;
      }
      default:
        return nothing;
    }
  }

  #progress(done: number): TemplateResult {
    const texts = this.#host.texts();
    const count = (draws: number): string => this.#host.number(String(draws));
    return html`
      <progress max=${USUAL_DRAWS} value=${done} aria-label=${texts.progress}></progress>
      <p class="small quiet">${fill(texts.done, { done: count(done), draws: count(USUAL_DRAWS) })}</p>
    `;
  }

  #outcome({ value, u, unit, seed, draws, simulated, check }: Outcome): TemplateResult {
    const texts = this.#host.texts();
    const write = this.#writer(u);
    const range = ([low, high]: Interval): string => withUnit(fill(texts.range, { low: write(low), high: write(high) }), unit);
    const plain = (figure: number): string => withUnit(write(figure), unit);
    const significant = (figure: number, digits: number): string => withUnit(this.#significant(figure, digits), unit);
    const below = simulated.belowLimit;
    const limit = below && withUnit(this.#host.number(String(below.limit)), unit);
    const row = (name: string, first: string, second: string): TemplateResult => html`<tr><th scope="row">${name}</th><td>${first}</td><td>${second}</td></tr>`;
    const percent = (share: number): string => `${this.#host.number((100 * share).toFixed(1))}\u00a0%`;
    const count = (figure: number): string => this.#host.number(String(figure));
    const [low, high] = simulated.symmetric;
    const { from, to } = simulated.histogram;
    const plot = fill(texts.plot, { draws: count(simulated.draws), from: plain(from), to: plain(to), low: plain(low), high: plain(high) });
    const limitText = limit && fill(below.limit >= from && below.limit <= to ? texts.limitIn : texts.limitBeside, { limit });
    return html`
      <table class="ways">
        <caption class="unseen">${texts.title}</caption>
        <thead><tr><td></td><th scope="col">${texts.firstOrder}</th><th scope="col">${texts.monteCarlo}</th></tr></thead>
        <tbody>
          ${row(texts.mean, plain(value.toNumber()), plain(simulated.mean))}
          ${row(texts.u, significant(u.toNumber(), 3), significant(simulated.u, 3))}
          ${row(texts.interval, range(check.interval), range(simulated.symmetric))} ${row(texts.shortest, range(check.interval), range(simulated.shortest))}
          ${below && limit ? row(fill(texts.below, { limit }), percent(probabilityBelow(value, u, new Decimal(below.limit))), percent(below.share)) : nothing}
        </tbody>
      </table>
      ${histogram({ ...simulated.histogram, interval: simulated.symmetric, limit: below?.limit, label: `${plot} ${limitText ?? ''}`.trim(), write })}
      <p class="small quiet">${plot} ${limitText ?? nothing}</p>
      ${simulated.draws < draws ? html`<p class="gate">${fill(texts.valueless, { count: count(draws - simulated.draws) })}</p>` : nothing}
      <p class="small quiet">${fill(texts.how, { draws: count(draws), seed: count(seed), error: significant(simulated.uError, 1) })}</p>
    `;
  }

  #significant(figure: number, significant: number): string {
    return this.#host.number(shownText(new Decimal(figure), { significant }));
  }

  /** Figures to the place of the third digit of u: enough to see how little the two ways differ. */
  #writer(u: Decimal): (figure: number) => string {
    const decimals = shownText(u, { significant: 3 }).split('.')[1]?.length ?? 0;
    return (figure) => this.#host.number(shownText(new Decimal(figure), { decimals }));
  }

  // -- the series ------------------------------------------------------------

  #follow(key: string): void {
    const [about, entry, site] = [this.#about, this.#host.entry(), this.#host.site()];
    if (about && about[0] === key && about[1] === entry && about[2] === site) return;
    this.#about = [key, entry, site];
    this.#drawing?.stop();
    this.#seed = 0;
    this.#state = { is: 'idle' };
  }

  #start(key: string, draw: typeof drawInWorker): void {
    const order = { entry: this.#host.entry(), site: this.#host.site(), keys: [key], draws: USUAL_DRAWS, seed: ++this.#seed };
    this.#become({ is: 'running', done: 0 });
    this.#drawing = draw(order, {
      progress: (done) => this.#progressed(done),
      result: (result) => this.#become(outcomeOf(order, key, result)),
      refused: () => {
        this.#seed--;
        this.#become({ is: 'no-worker' });
      },
      failed: (error) => this.#become({ is: 'failed', error }),
    });
  }

  /** Shown in twentieths: the section around renders all of its figures anew each time. */
  #progressed(done: number): void {
    if (this.#state.is === 'running' && done - this.#state.done >= USUAL_DRAWS / 20) this.#become({ is: 'running', done });
  }

  #stop(): void {
    this.#drawing?.stop();
    this.#seed--;
    this.#become({ is: 'idle' });
  }

  #become(state: State): void {
    this.#state = state;
    this.#element.requestUpdate();
  }
}

function outcomeOf({ entry, site, seed, draws }: MonteCarloOrder, key: string, { results }: MonteCarlo): State {
  const run = lotRun(entry, site);
  const simulated = results[key];
  const uncertainty = simulated && uncertaintyOf(run, key);
  if (!uncertainty || !('u' in uncertainty) || uncertainty.u.isZero()) return { is: 'not-known' };
  const value = run.findings.outcome(key) as Decimal;
  const { u } = uncertainty;
  const check = checkFirstOrder(value.toNumber(), u.toNumber(), simulated);
  return { is: 'done', outcome: { value, u, unit: run.sheet.quantity(key).unit.symbol, seed, draws, simulated, check } };
}

const withUnit = (text: string, unit: string): string => (unit ? `${text}\u00a0${unit}` : text);
