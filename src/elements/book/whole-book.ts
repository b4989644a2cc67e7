import { html } from 'lit';
import type { TemplateResult } from 'lit';
import type { BookTongue } from './book-words.js';

interface WholeBook {
  readonly empty: boolean;
  readonly busy: boolean;
  readonly save: () => void;
  readonly restore: (file: File) => void;
}

/** Where the book is, a file of it, and what a file brings back. */
export function wholeBook({ words }: BookTongue, { empty, busy, save, restore }: WholeBook): TemplateResult {
  const chosen = ({ target }: Event): void => {
    const input = target as HTMLInputElement;
    const file = input.files?.[0];
    if (file) restore(file);
    // so that the same file can be chosen again
    input.value = '';
  };
  const choose = ({ currentTarget }: Event): void => ((currentTarget as HTMLElement).nextElementSibling as HTMLInputElement).click();
  return html`
    <p class="small quiet">${words.here}</p>
    <div class="actions">
      <button class="action" part="action" type="button" ?disabled=${busy || empty} @click=${save}>${words.export}</button>
      <button class="action" part="action" type="button" ?disabled=${busy} @click=${choose}>${words.restore}</button>
      <input type="file" accept=".json,application/json" hidden aria-label=${words.restore} @change=${chosen} />
    </div>
  `;
}
