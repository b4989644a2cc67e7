import { css, html } from 'lit';
import { property, query, state } from 'lit/decorators.js';
import type { SheetHost } from '../../exchange/sheet-host/sheet-host.js';
import type { ColumnMemory } from '../../exchange/table/columns.js';
import type { BlendStock } from '../../lot/blend-stock.js';
import { nextLot } from '../../lot/edit.js';
import { EMPTY_LOT } from '../../lot/entry.js';
import { LotElement } from '../parts/base.js';
import { EsterwayOpenEvent, EsterwayUndoEvent } from '../parts/events.js';
import { faultsBox } from '../parts/faults.js';
import { groupsFields } from '../parts/focus-order.js';
import { buttons, boxes, tokens } from '../parts/styles.js';
import type {} from '../charge/charge-sheet.js';
import type { EsterwayStockChangeEvent } from '../blend/events.js';
import type { EsterwayCharge } from '../charge/charge.js';
import { loadParts } from '../parts/late-parts.js';
import type { EsterwayColumnsChangeEvent } from '../rows/events.js';
import type { EsterwayWorking } from '../working/working.js';

/**
 * The whole job in one narrow column: lot, titration, route, charge, working, site values. Wide, it
 * sets them side by side.
 *
 * @element esterway-panel
 * @attr {'metric' | 'us'} units - units in which amounts are shown
 *
 * @fires {EsterwayChangeEvent} esterway-change - a person changed the lot; it carries the entry and the reading
 * @fires {EsterwaySiteChangeEvent} esterway-site-change - a person changed a site value; keep it and set it again next time
 * @fires {EsterwayOpenEvent} esterway-open - a person wants to see how a figure was worked out; the panel opens it
 * @fires {EsterwayStockChangeEvent} esterway-stock-change - a person changed what is in stock; keep it and set `stock` again next time
 *
 * @fires {EsterwayKeptEvent} esterway-kept - a person kept or amended a lot in the intake book
 * @fires {EsterwayColumnsChangeEvent} esterway-columns-change - a person corrected what a column of a sheet is; keep it and set `columnMemory` again next time
 *
 * @slot - more actions, beside the panel's own
 *
 * @csspart actions - the row of actions
 * @csspart action - an action
 * @csspart section - a section
 * @csspart figure - a figure that opens its working
 *
 * @cssprop --esterway-paper - background
 * @cssprop --esterway-ink - text
 * @cssprop --esterway-quiet - labels and units
 * @cssprop --esterway-rule - lines between sections
 * @cssprop --esterway-faint - faint lines and backgrounds
 * @cssprop --esterway-glass - lines of fields, the burette, buttons
 * @cssprop --esterway-amber - limits, headings of steps, cautions
 * @cssprop --esterway-oil - the oil in the burette
 * @cssprop --esterway-pink - what is live or asks for attention
 * @cssprop --esterway-pink-soft - behind what asks for attention
 * @cssprop --esterway-margin - the margin line
 * @cssprop --esterway-font - font family
 * @cssprop --esterway-font-size - size of plain text; everything else follows
 */
export class EsterwayPanel extends LotElement {
  static override styles = [
    tokens,
    buttons,
    boxes,
    css`
      :host {
        container-type: inline-size;
        background: var(--_paper);
        border: 1px solid var(--_rule);
        border-radius: 3px;
      }
      .columns > * {
        border-block-end: 1px solid var(--_rule);
      }
      .later {
        position: relative;
        padding-inline: 38px 14px;
      }
      /* the margin line of the notebook runs on */
      .later::before {
        content: '';
        position: absolute;
        inset-block: 0;
        inset-inline-start: 26px;
        border-inline-start: 1px solid var(--_margin);
      }
      .actions {
        display: flex;
        flex-wrap: wrap;
        gap: 8px;
        padding: 10px 14px 12px 38px;
        padding-inline: 38px 14px;
      }
      .said {
        padding-inline: 38px 14px;
        color: var(--_quiet);
        font-size: 0.92em;
      }
      .fault {
        margin: 12px;
      }
      @container (min-width: 700px) {
        .columns {
          columns: 2;
          column-gap: 0;
          column-rule: 1px solid var(--_rule);
        }
        .columns > * {
          break-inside: avoid;
        }
      }
      @container (min-width: 1060px) {
        .columns {
          columns: 3;
        }
      }
      @media print {
        :host {
          border: 0;
        }
        .columns {
          columns: 1;
        }
        .columns > * {
          break-inside: auto;
        }
      }
    `,
  ];

  /** What is in stock to blend, and the limits of the blend; a page may keep it. */
  @property({ attribute: false }) stock: BlendStock | undefined;

  /** The sheet around the page, if there is one: its rows are read, and results written beside them. */
  @property({ attribute: false }) sheet: SheetHost | undefined;
  /** What columns of sheets were taken for before; a page may keep it. */
  @property({ attribute: false }) columnMemory: ColumnMemory | undefined;

  @query('esterway-working') private readonly working!: EsterwayWorking | null;
  @query('esterway-charge') private readonly charge!: EsterwayCharge | null;
  /** What was just done, for those who do not see it happen. */
  @state() private said = '';

  constructor() {
    super();
    groupsFields(this);
    this.addEventListener(EsterwayOpenEvent.type, this.onOpen);
  }

  protected override render(): unknown {
    const { texts, desk } = this;
    return html`
      <div role="group" aria-label=${texts.panel.label}>
        ${'faults' in desk.reading ? faultsBox(desk.reading, texts) : this.sections()}
        <p class="said no-print" role="status">${this.said}</p>
        <div class="actions no-print" part="actions">
          <button class="action main" part="action" type="button" @click=${this.onPrint}>${texts.panel.print}</button>
          <button class="action" part="action" type="button" @click=${this.onNewLot}>${texts.panel.newLot}</button>
          <button class="action" part="action" type="button" ?disabled=${!desk.canUndo} @click=${this.onUndo}>${texts.panel.undo}</button>
          <slot></slot>
        </div>
      </div>
    `;
  }

  private sections(): unknown {
    const parts = 'section, figure';
    return html`
      <div class="columns">
        <esterway-lot exportparts=${parts}></esterway-lot>
        <esterway-titration exportparts=${parts}></esterway-titration>
        <esterway-route exportparts=${parts} .stock=${this.stock} @esterway-stock-change=${this.onStock}></esterway-route>
        <esterway-charge exportparts=${parts}></esterway-charge>
        <esterway-working class="no-print" exportparts=${parts}></esterway-working>
        <div class="later no-print">
          <esterway-later needs="book" .label=${this.texts.panel.book} .content=${book}></esterway-later>
          <esterway-later needs="sheets" .label=${this.texts.panel.results} .content=${results}></esterway-later>
          <esterway-later needs="sheets" .label=${this.texts.panel.rows} .content=${this.rows}></esterway-later>
        </div>
        <esterway-site-values class="no-print" folded exportparts=${parts}></esterway-site-values>
      </div>
    `;
  }

  private readonly rows = (): unknown => html`<esterway-rows bare .host=${this.sheet} .columnMemory=${this.columnMemory} @esterway-columns-change=${this.onColumns}></esterway-rows>`;

  private onColumns({ columnMemory }: EsterwayColumnsChangeEvent): void {
    this.columnMemory = columnMemory;
  }

  private onStock({ stock }: EsterwayStockChangeEvent): void {
    this.stock = stock;
  }

  private readonly onOpen = (event: EsterwayOpenEvent): void => {
    const { working } = this;
    if (!working) return;
    working.folded = false;
    working.of = event.key;
    void working.updateComplete.then(() => working.showOpened());
  };

  /** The charge on paper, a page a step; the panel as it stands where there is no charge yet, or its page cannot be had. */
  private async onPrint(): Promise<void> {
    const { entry, site, units, languageTag, charge } = this;
    const route = charge?.looked;
    if (!route || this.reading(`${route}.catalyst`)?.value === undefined) return window.print();
    try {
      await loadParts('more');
      const sheet = document.createElement('esterway-charge-sheet');
      await Object.assign(sheet, { entry, site, units, route }).print(languageTag);
    } catch {
      window.print();
    }
  }

  private onNewLot(): void {
    const { entry, reading } = this.desk;
    this.edit({ kind: 'replace', entry: 'faults' in reading ? EMPTY_LOT : nextLot(entry) });
    this.said = this.texts.panel.newLotDone;
  }

  private onUndo(): void {
    this.dispatchEvent(new EsterwayUndoEvent());
    this.said = this.texts.panel.undone;
  }
}

const results = (): unknown => html`<esterway-results bare></esterway-results>`;
const book = (): unknown => html`<esterway-book bare exportparts="figure"></esterway-book>`;

declare global {
  interface HTMLElementTagNameMap {
    'esterway-panel': EsterwayPanel;
  }
}
