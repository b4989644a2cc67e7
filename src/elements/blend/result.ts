import { css, html, nothing, svg } from 'lit';
import type { CSSResult, TemplateResult } from 'lit';
import { SHARES } from '../../decision/blend/stock.js';
import type { Share } from '../../decision/blend/stock.js';
import { showNumber } from '../../exchange/number-format.js';
import { Decimal } from '../../formula/decimal.js';
import { shownText } from '../../formula/digits.js';
import { kilogram, pound } from '../../formula/units.js';
import { fill } from '../../locales/fill.js';
import type { Widened } from '../../locales/en.js';
import type { enBlend } from '../../locales/en-blend.js';
import type { BlendFound, BlendRefused } from '../../lot/blend.js';
import { inMoney } from '../parts/money.js';

/** The sentences, how figures are written, and what the limits are. */
export interface BlendTongue {
  readonly words: Widened<typeof enBlend>;
  readonly tag: string;
  readonly us: boolean;
  /** How the site writes its money. */
  readonly currency: string | undefined;
  /** What an item is called. */
  readonly lot: (item: number) => string;
  /** The limits in force, % and kg, as decimal text. */
  readonly limits: Readonly<Partial<Record<Share | 'mass', string>>>;
  readonly rule: keyof typeof enBlend.massRules;
}

/** A mass as it is dispensed: never rounded to fewer digits in kilograms. */
export function massText(kilograms: string, { us, tag }: Pick<BlendTongue, 'us' | 'tag'>): string {
  const value = new Decimal(kilograms);
  const text = us ? trimmed(shownText(kilogram.convert(value, pound), { decimals: 2 })) : trimmed(shownText(value, { decimals: 6 }));
  return `${showNumber(text, tag)}\u00a0${us ? 'lb' : 'kg'}`;
}

/** Of a worth or a bound no one needs more than three digits behind the point. */
const about = (kilograms: string): string => shownText(new Decimal(kilograms), { significant: 3 });
const trimmed = (text: string): string => new Decimal(text).toString();

/** FFA to 0.01 %, the rest to 0.001 %; finer where the limit is. */
function shareText(value: string, share: Share, limit: string | undefined): string {
  return shownText(new Decimal(value), { decimals: Math.max(share === 'freeFattyAcid' ? 2 : 3, limit?.split('.')[1]?.length ?? 0) });
}

const money = (value: string): string => shownText(new Decimal(value), { decimals: 2 });

/** The masses with their bars, the blend against its limits, and what would loosen it. */
export function blendResult(found: BlendFound, tongue: BlendTongue): TemplateResult {
  const { words, tag } = tongue;
  const { goal, mass, sour, sourThere, cost, shares, parts, step } = found;
  const ffa = shareText(shares.freeFattyAcid ?? '0', 'freeFattyAcid', tongue.limits.freeFattyAcid);
  const unit = inMoney(tongue.us ? '¤/lb' : '¤/kg', tongue.currency);
  const perMass = cost === undefined ? '' : shownText(new Decimal(cost).div(tongue.us ? kilogram.convert(new Decimal(mass), pound) : mass), { decimals: 3 });
  const figures = { mass: massText(mass, tongue), sour: massText(sour, tongue), sourThere: massText(sourThere, tongue), ffa: showNumber(ffa, tag), cost: showNumber(money(cost ?? '0'), tag), perMass: showNumber(perMass, tag), unit };
  const { pair } = found;
  return html`
    <div role="status"><p><b>${fill(words.found[goal], figures)}</b></p></div>
    ${found.remarks.map((code) => html`<p class="gate">${fill(words.remarks[code], { step: massText(step, tongue) })}</p>`)}
    ${partsTable(parts, tongue)}
    ${propertyTable(found, tongue, cost === undefined ? undefined : `${figures.cost}\u00a0${inMoney('¤', tongue.currency)}`)}
    ${pair ? html`<p class="small">${fill(words.pair, { lot: tongue.lot(pair.item), most: showNumber(shownText(new Decimal(pair.most), { decimals: 1 }), tag), limit: words.names[pair.by] })}</p>` : nothing}
    ${worths(found, tongue)}
    <p class="small quiet">${words.titrate}</p>
  `;
}

function partsTable(parts: BlendFound['parts'], tongue: BlendTongue): TemplateResult {
  const { words, tag } = tongue;
  const largest = parts.reduce((most, { available }) => Decimal.max(most, available), new Decimal(0));
  const width = (value: string): string => new Decimal(value).div(largest).times(100).toFixed(2);
  return html`
    <table class="parts">
      <thead>
        <tr><th scope="col">${words.part}</th><th scope="col">${words.take}</th><th scope="col">% <span class="unseen">${words.ofBlend}</span></th></tr>
      </thead>
      <tbody>
        ${parts.map(({ item, mass, available, share }) => html`<tr>
          <th scope="row">
            ${tongue.lot(item)}
            <svg class="bar" viewBox="0 0 100 7" preserveAspectRatio="none" aria-hidden="true">
              ${svg`<rect class="taken" width=${width(mass)} height="7" /><rect class="there" width=${width(available)} height="7" />`}
            </svg>
          </th>
          <td><b>${massText(mass, tongue)}</b> <span class="quiet small">${mass === available ? words.all : fill(words.of, { available: massText(available, tongue) })}</span></td>
          <td>${showNumber(shownText(new Decimal(share), { decimals: 1 }), tag)}</td>
        </tr>`)}
      </tbody>
    </table>
    <p class="note">${words.bars}</p>
  `;
}

function propertyTable({ mass, shares }: BlendFound, tongue: BlendTongue, cost: string | undefined): TemplateResult {
  const { words, tag, limits, rule } = tongue;
  const rows = SHARES.filter((share) => shares[share] !== undefined || limits[share] !== undefined).map((share): readonly string[] => {
    const [value, limit] = [shares[share], limits[share]];
    return [words.columns[share], value === undefined ? words.notKnown : `${showNumber(shareText(value, share, limit), tag)}\u00a0%`, limit === undefined ? '–' : `${showNumber(limit, tag)}\u00a0%`];
  });
  rows.push([words.mass, massText(mass, tongue), limits.mass === undefined ? '–' : `${words.massRules[rule]} ${massText(limits.mass, tongue)}`]);
  if (cost !== undefined) rows.push([words.cost, cost, '–']);
  return html`
    <table class="parts">
      <thead>
        <tr><th scope="col">${words.property}</th><th scope="col">${words.is}</th><th scope="col">${words.atMost}</th></tr>
      </thead>
      <tbody>
        ${rows.map(([name, is, limit]) => html`<tr><th scope="row">${name}</th><td>${is}</td><td>${limit}</td></tr>`)}
      </tbody>
    </table>
  `;
}

/** Sentences told one by one; the rest are worth less. */
const MOST_WORTHS = 4;

function worths({ bindings, goal }: BlendFound, tongue: BlendTongue): TemplateResult | typeof nothing {
  const { words, tag } = tongue;
  if (!bindings.length) return nothing;
  const limitName = ({ code, of, item }: BlendFound['bindings'][number]): string => (code === 'share' && of ? words.names[of] : code === 'mass' ? words.amountLimit : tongue.lot(item ?? 0));
  const told = bindings.flatMap((binding) => {
    const { code, step, worth, item } = binding;
    if (worth === undefined) return [];
    const gain = fill(words.gain[goal], { worth: goal === 'least-cost' ? showNumber(money(worth), tag) : massText(about(worth), tongue) });
    const change = code === 'mass' ? (step.startsWith('-') ? 'lessMass' : 'moreMass') : code;
    const size = step.replace('-', '');
    return [fill(words.change[change], { gain, limit: limitName(binding), lot: tongue.lot(item ?? 0), step: code === 'share' ? showNumber(size, tag) : massText(size, tongue) })];
  });
  const idle = bindings.filter(({ worth }) => worth === undefined).map(limitName);
  return html`
    <h3>${words.worthTitle}</h3>
    <ul>
      ${told.slice(0, MOST_WORTHS).map((text) => html`<li>${text}</li>`)}
    </ul>
    ${idle.length ? html`<p class="small quiet">${fill(words.idle, { limits: idle.join(', ') })}</p>` : nothing}
  `;
}

/** Why there is no blend, and what would make one. */
export function blendRefused({ refused, share, found, remedies }: BlendRefused, tongue: BlendTongue): TemplateResult {
  const { words, tag } = tongue;
  const name = share ? words.names[share] : '';
  const figure = found === undefined ? '' : share ? showNumber(found, tag) : massText(found, tongue);
  const said = remedies.map((remedy) => {
    switch (remedy.code) {
      case 'raise-limit':
        return fill(words.remedies[remedy.code], { to: showNumber(remedy.to, tag), limit: words.names[remedy.of] });
      case 'less-mass':
      case 'more-mass':
        return fill(words.remedies[remedy.code], { to: massText(remedy.to, tongue) });
      case 'less-of':
        return fill(words.remedies[remedy.code], { to: massText(remedy.to, tongue), lot: tongue.lot(remedy.item) });
      case 'more-of':
        return fill(words.remedies[remedy.code], { by: massText(remedy.by, tongue), lot: tongue.lot(remedy.item) });
    }
  });
  const infeasible = INFEASIBLE.includes(refused);
  return html`
    <div role="status" class=${infeasible ? 'gate' : ''}>
      <p>${fill(words.refused[refused], { share: name, found: figure, limit: share ? showNumber(tongue.limits[share] ?? '', tag) : '' })}</p>
      ${said.length ? html`<p>${words.remedyTitle}</p><ul>${said.map((text) => html`<li>${text}</li>`)}</ul>` : refused === 'together' ? html`<p>${words.noRemedy}</p>` : nothing}
    </div>
  `;
}

const INFEASIBLE: readonly BlendRefused['refused'][] = ['above-all', 'too-little', 'must-use-too-much', 'together'];

export const resultStyles: CSSResult = css`
  .parts {
    inline-size: 100%;
    margin-block-start: 8px;
    border-collapse: collapse;
  }
  .parts th {
    font-weight: 400;
    text-align: start;
    overflow-wrap: anywhere;
  }
  .parts thead th {
    color: var(--_quiet);
    font-size: 0.86em;
  }
  .parts td,
  .parts thead th:not(:first-child) {
    text-align: end;
  }
  .parts td span {
    display: block;
  }
  .parts td,
  .parts th {
    padding: 3px 0 3px 8px;
    padding-inline: 8px 0;
    border-block-end: 1px solid var(--_faint);
    vertical-align: top;
  }
  .parts th:first-child {
    padding-inline: 0;
  }
  .bar {
    display: block;
    inline-size: 100%;
    block-size: 9px;
    margin-block: 3px;
    overflow: visible;
  }
  .bar .taken {
    fill: var(--_amber);
  }
  .bar .there {
    fill: none;
    stroke: var(--_glass);
    stroke-width: 1;
    vector-effect: non-scaling-stroke;
  }
  .result ul {
    padding-inline-start: 1.1em;
    list-style: disc;
  }
  @media (forced-colors: active) {
    .bar .taken {
      fill: Highlight;
    }
    .bar .there {
      stroke: CanvasText;
    }
  }
  @media print {
    .bar .taken {
      fill: #777;
      print-color-adjust: exact;
    }
  }
`;
