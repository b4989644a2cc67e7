import { html, nothing } from 'lit';
import type { TemplateResult } from 'lit';
import { live } from 'lit/directives/live.js';
import { moveFocus } from '../parts/focus-order.js';

interface TextLine {
  readonly id: string;
  readonly label: string;
  readonly value: string;
  readonly typed: (text: string) => void;
  readonly type?: 'text' | 'date' | 'search';
  readonly placeholder?: string;
  readonly problem?: string | undefined;
  /** Over the whole width, for a sentence. */
  readonly wide?: boolean;
}

/** A field for words or a day; Enter goes on to the next. */
export function textLine({ id, label, value, typed, type = 'text', placeholder = '', problem, wide = false }: TextLine): TemplateResult {
  return html`<div class=${wide ? 'wide' : nothing}>
    <label for=${id}>${label}</label>
    <div class="line ${problem ? 'wrong' : ''}" part="field-line">
      <input
        class="words"
        id=${id}
        data-field
        part="field-input"
        type=${type}
        autocomplete="off"
        placeholder=${placeholder || nothing}
        aria-describedby=${`${id}-said`}
        .value=${live(value)}
        @input=${(event: InputEvent) => typed((event.target as HTMLInputElement).value)}
        @keydown=${onKeydown}
      />
    </div>
    <div id=${`${id}-said`}>${problem ? html`<p class="problem">${problem}</p>` : nothing}</div>
  </div>`;
}

function onKeydown(event: KeyboardEvent): void {
  if (event.key !== 'Enter' || event.isComposing) return;
  event.preventDefault();
  moveFocus(event.target as HTMLElement, event.shiftKey ? -1 : 1);
}
