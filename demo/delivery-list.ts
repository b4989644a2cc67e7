import type { LotEntry } from 'esterway/core';
import type { EsterwayChangeEvent } from 'esterway';
import type { Delivery } from './lots.ts';
import { figureWords, sentence } from './page-texts.ts';
import type { Language } from './settings.ts';

interface Row {
  readonly delivery: Delivery;
  readonly button: HTMLButtonElement;
  readonly amount: HTMLElement;
  readonly said: HTMLElement;
}

/** The deliveries of the day: one is on the bench, and beside it stands what the panel's last event carried. */
export class DeliveryList {
  readonly #rows: readonly Row[];
  readonly #stray: HTMLElement;
  #bench: LotEntry | undefined;
  #event: EsterwayChangeEvent | undefined;
  #lang: Language = 'en';

  constructor(list: HTMLElement, stray: HTMLElement, deliveries: readonly Delivery[], onChoose: (delivery: Delivery) => void) {
    this.#stray = stray;
    this.#rows = deliveries.map(rowOf);
    for (const { delivery, button, said } of this.#rows) {
      button.addEventListener('click', () => onChoose(delivery));
      const item = document.createElement('li');
      item.append(button, said);
      list.append(item);
    }
  }

  /** The delivery on the bench, as `?lot=` names it. */
  get loaded(): string | undefined {
    return this.#rows.find(({ delivery }) => this.#isOnBench(delivery))?.delivery.id;
  }

  put(entry: LotEntry): void {
    this.#bench = entry;
    this.#event = undefined;
    this.#write();
  }

  heard(event: EsterwayChangeEvent): void {
    this.#bench = event.entry;
    this.#event = event;
    this.#write();
  }

  speak(lang: Language): void {
    this.#lang = lang;
    this.#write();
  }

  #isOnBench({ entry }: Delivery): boolean {
    return this.#bench?.name === entry.name;
  }

  #write(): void {
    for (const { delivery, button, amount, said } of this.#rows) {
      const loaded = this.#isOnBench(delivery);
      button.ariaPressed = String(loaded);
      amount.textContent = amountWords(delivery, this.#lang);
      said.hidden = !loaded || !this.#event;
      said.replaceChildren(...(loaded ? this.#eventWords() : []));
    }
    const bench = this.#bench;
    this.#stray.hidden = !bench || this.loaded !== undefined;
    const named = sentence(this.#lang, 'stray', bench?.name ?? sentence(this.#lang, 'untitled'));
    this.#stray.replaceChildren(...(this.#stray.hidden ? [] : [named, ' ', ...this.#eventWords()]));
  }

  /** What the event carried: the FFA as reported, and the code of the verdict. */
  #eventWords(): (string | Node)[] {
    if (!this.#event) return [];
    const { reading } = this.#event;
    const code = document.createElement('code');
    code.textContent = 'faults' in reading ? (reading.faults[0]?.code ?? '') : reading.route.verdict;
    return [`${sentence(this.#lang, 'event')} ${this.#ffaWords()}, `, code];
  }

  #ffaWords(): string {
    const reading = this.#event?.reading;
    if (!reading || 'faults' in reading) return sentence(this.#lang, 'faults');
    const shown = reading.readings['freeFattyAcid']?.shown;
    return shown === undefined ? sentence(this.#lang, 'noFfa') : sentence(this.#lang, 'ffa', figureWords(shown, this.#lang));
  }
}

function rowOf(delivery: Delivery): Row {
  const { time, entry } = delivery;
  const part = (className: string, text: string): HTMLElement => {
    const element = document.createElement('span');
    element.className = className;
    element.textContent = text;
    return element;
  };
  const button = document.createElement('button');
  button.type = 'button';
  button.className = 'delivery';
  button.dataset['lot'] = delivery.id;
  const amount = part('amount', '');
  button.append(part('time', time), ' ', part('name', entry.name), ' ', part('source', entry.source), ' ', amount);
  const said = document.createElement('p');
  said.className = 'said';
  return { delivery, button, amount, said };
}

function amountWords({ entry }: Delivery, lang: Language): string {
  const figure = entry.figures['oilAmount'];
  if (!figure) return '';
  return `${'text' in figure ? figureWords(figure.text, lang) : figure.typed} ${figure.unit}`;
}
