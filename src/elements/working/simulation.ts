import { property } from 'lit/decorators.js';
import { showNumber } from '../../exchange/number-format.js';
import { deMonteCarlo } from '../../locales/de-monte-carlo.js';
import { enMonteCarlo } from '../../locales/en-monte-carlo.js';
import { LotElement } from '../parts/base.js';
import { boxes, buttons, tokens } from '../parts/styles.js';
import { MonteCarloCheck } from './monte-carlo.js';

const TEXTS = { en: enMonteCarlo, de: deMonteCarlo };

/** The check of one figure's uncertainty by Monte Carlo. Stands in the working. */
export class SimulationElement extends LotElement {
  static override styles = [tokens, buttons, boxes, ...MonteCarloCheck.styles];

  /** Key of the figure. */
  @property() of = '';

  readonly #check = new MonteCarloCheck(this, {
    entry: () => this.desk.entry, site: () => this.desk.site, texts: () => this.textsOf(TEXTS), number: (text) => showNumber(text, this.languageTag),
  });

  protected override render(): unknown {
    return this.#check.render(this.of);
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-simulation': SimulationElement;
  }
}
