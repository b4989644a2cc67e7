import { css, html } from 'lit';
import { dePlan } from '../../locales/de-plan.js';
import { enPlan } from '../../locales/en-plan.js';
import { planTitration } from '../../lot/titration-plan.js';
import { SectionElement } from '../parts/section.js';
import { planView } from './plan-view.js';

const TEXTS = { en: enPlan, de: dePlan };

/** Portion and titrant for an acid value to expect. Stands in the titration. */
export class PlanElement extends SectionElement {
  static override styles = [
    ...SectionElement.styles,
    css`
      .note {
        color: var(--_quiet);
        font-size: 0.92em;
      }
    `,
  ];

  protected override get heading(): string {
    return this.texts.titrant.plan;
  }

  protected override body(): unknown {
    const texts = this.textsOf(TEXTS);
    const { entry, site } = this.desk;
    const plan = planTitration(entry, site);
    const lacking = this.reading('titrantConcentration')?.value === undefined && 'expectedAcidValue' in entry.figures ? texts.noTitrant : texts.none;
    const words = { texts, tag: this.languageTag, byVolume: this.option('sampleTakenBy') === 'volume' };
    return html`
      <div class="fields">${this.figureField('expectedAcidValue', ['mg/g'])} ${this.optionField('portionTable')}</div>
      <div role="status">${plan ? planView(plan, words) : html`<p class="note">${lacking}</p>`}</div>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'esterway-plan': PlanElement;
  }
}
