import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { showNumber } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { fill } from '../../locales/fill.js';
import type { Widened } from '../../locales/en.js';
import type { enPlan } from '../../locales/en-plan.js';
import type { TitrationPlan } from '../../lot/titration-plan.js';

/** What the plan needs to be told in words. */
export interface PlanWords {
  readonly texts: Widened<typeof enPlan>;
  readonly tag: string;
  /** Whether portions are measured out by volume. */
  readonly byVolume: boolean;
}

/** The portion, the titrant and the titre to expect, and the ± that two runs should leave. */
export function planView(plan: TitrationPlan, { texts, tag, byVolume }: PlanWords): TemplateResult {
  const write = (value: Decimal, significant: number): string => showNumber(shownText(value, { significant }), tag);
  const words = {
    portion: write(new Decimal(byVolume && plan.keep ? plan.portionVolume : plan.portion), 2), titre: write(new Decimal(plan.titre), 2), strength: write(new Decimal(plan.strength), 3),
    tablePortion: write(new Decimal(plan.tablePortion), 2), capacity: showNumber(plan.capacity, tag),
    expanded: plan.expanded === undefined ? '' : write(new Decimal(plan.expanded), 2),
  };
  const sentence = plan.keep ? (byVolume ? texts.measure : texts.weigh) : texts.change;
  return html`
    <p><b>${fill(sentence, words)}</b> ${plan.expanded === undefined ? nothing : fill(texts.expect, words)}</p>
    ${plan.likeTable ? nothing : html`<p class="gate">${fill(texts.unlikeTable, words)}</p>`}
    <p class="small quiet">${fill(texts.goodPart, words)}</p>
  `;
}
