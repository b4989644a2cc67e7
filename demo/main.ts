import 'esterway/define';
import { DeliveryList } from './delivery-list.ts';
import { DAY, deliveries } from './lots.ts';
import type { Delivery } from './lots.ts';
import { dayWords, writeTexts } from './page-texts.ts';
import { plant, stock } from './plant.ts';
import { applyToPage, keepSettings, lotInAddress, readSettings, settingsIn } from './settings.ts';
import type { Settings } from './settings.ts';

const panel = document.querySelector('esterway-panel')!;
const form = document.querySelector<HTMLFormElement>('#settings')!;
const dock = document.querySelector('#dock')!;
const list = new DeliveryList(document.querySelector('#deliveries')!, document.querySelector('#stray')!, deliveries, load);
let settings = readSettings();

panel.site = plant;
panel.stock = stock;
panel.addEventListener('esterway-change', (event) => list.heard(event));
form.addEventListener('change', () => {
  settings = settingsIn(form);
  apply(settings);
  keepSettings(settings, list.loaded);
});

for (const [name, value] of Object.entries(settings)) {
  form.querySelector<HTMLSelectElement>(`[name=${name}]`)!.value = value;
}
apply(settings);
const asked = deliveries.find(({ id }) => id === lotInAddress());
if (asked) put(asked);

/** A delivery was pressed. */
function load(delivery: Delivery): void {
  put(delivery);
  keepSettings(settings, delivery.id);
  // where the panel stands below the list, the press would seem to do nothing
  if (matchMedia('(width < 760px)').matches) dock.scrollIntoView();
  else dock.scrollTop = 0;
}

function put({ entry }: Delivery): void {
  panel.entry = entry;
  list.put(entry);
}

function apply(now: Settings): void {
  applyToPage(now);
  panel.units = now.units;
  writeTexts(now.lang);
  document.querySelector('#day')!.textContent = dayWords(DAY, now.lang);
  list.speak(now.lang);
}
