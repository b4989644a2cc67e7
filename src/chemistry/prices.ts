import type { Expression } from '../formula/expression.js';
import { choice, limit, quantity } from '../formula/quantity.js';
import type { Choice, Limit, Quantity } from '../formula/quantity.js';
import type { Unit } from '../formula/unit.js';
import {
  currency, currencyPerHour, currencyPerKilogram, currencyPerKilowattHour, currencyPerLitre, currencyPerTonne, hour, kilowattHourPerTonne,
} from '../formula/units.js';
import { esterDensity } from './after-reaction.js';
import { CATALYST_PRODUCTS, catalyst, perProduct } from './catalyst.js';
import { methanolDensity } from './methanol.js';
import { ACID_PRODUCTS, acidDensity, byAcid, perAcid } from './neutralising.js';
import { oilDensity } from './oil.js';
import { COSTING } from './sources.js';

// What things cost the site, in its own money. None of it has a usual value: what a site leaves out is left out of its totals.

const BOUGHT = [limit('atLeast', '0', 'negative'), limit('atMost', '1000000000', 'out-of-range')];
/** A layer is paid for when it is taken away, or sold: then the figure is below zero. */
const TAKEN_AWAY = [limit('atLeast', '-1000000000', 'out-of-range'), limit('atMost', '1000000000', 'out-of-range')];

const own = (key: string, symbol: string, unit: Unit, limits: readonly Limit[] = BOUGHT): Quantity => quantity({ key, symbol, unit, limits });

/** A price by mass or by volume, as the unit says in which it is typed. */
function byMassOrVolume(key: string, symbol: string, unit: Unit, density: Expression): { readonly price: Quantity; readonly all: readonly (Quantity | Choice)[] } {
  const by = choice(`${key}By`, ['mass', 'volume']);
  const mass = own(`${key}ByMass`, `${symbol},m`, unit);
  const volume = own(`${key}ByVolume`, `${symbol},V`, currencyPerLitre);
  const price = quantity({ key, symbol, unit, cites: [COSTING], is: by.of({ mass, volume: volume.per(density).in(unit) }) });
  return { price, all: [by, mass, volume, price] };
}

const oil = byMassOrVolume('oilPrice', 'p_oil', currencyPerTonne, oilDensity);
const ester = byMassOrVolume('esterPrice', 'p_E', currencyPerTonne, esterDensity);
const methanol = byMassOrVolume('methanolPrice', 'p_M', currencyPerKilogram, methanolDensity);
export const [oilPrice, esterPrice, methanolPrice] = [oil.price, ester.price, methanol.price];
export const pricesByMassOrVolume = [...oil.all, ...ester.all, ...methanol.all];

export const sulfuricPrice = own('sulfuricPrice', 'p_S', currencyPerKilogram);
export const catalystPrices = perProduct(CATALYST_PRODUCTS, (product) => own(`${product}.price`, 'p_cat', currencyPerKilogram));
export const catalystPrice = quantity({ key: 'catalystPrice', symbol: 'p_cat', unit: currencyPerKilogram, cites: [COSTING], is: catalyst.of(catalystPrices) });
/** Of an acid as bought; vinegar by the litre. */
export const acidPrices = perAcid(ACID_PRODUCTS, (product) => own(`${product}.price`, 'p_a', product === 'vinegar' ? currencyPerLitre : currencyPerKilogram));
export const neutralisingPrice = quantity({
  key: 'neutralisingPrice', symbol: 'p_a', unit: currencyPerKilogram, cites: [COSTING],
  is: byAcid({ ...acidPrices, vinegar: acidPrices.vinegar.per(acidDensity.vinegar).in(currencyPerKilogram), sulfuric: sulfuricPrice }),
});

/** Of the layers drawn off after the acid step, and of the lower layer of the base step. */
export const drawnOffPrice = own('drawnOffPrice', 'p_off', currencyPerTonne, TAKEN_AWAY);
export const lowerLayerPrice = own('lowerLayerPrice', 'p_low', currencyPerTonne, TAKEN_AWAY);

export const energyPrice = own('energyPrice', 'p_kWh', currencyPerKilowattHour);
export const energyBaseStep = own('energyBaseStep', 'E_base', kilowattHourPerTonne);
export const energyAcidPass = own('energyAcidPass', 'E_pass', kilowattHourPerTonne);
export const energyBaseRate = quantity({ key: 'energyBaseRate', symbol: 'k_E,base', unit: currencyPerTonne, cites: [COSTING], is: energyBaseStep.times(energyPrice) });
export const energyPassRate = quantity({ key: 'energyPassRate', symbol: 'k_E,pass', unit: currencyPerTonne, cites: [COSTING], is: energyAcidPass.times(energyPrice) });

/** What an hour of a batch costs: people, plant, room. */
export const hourPrice = own('hourPrice', 'p_h', currencyPerHour);
export const hoursBaseStep = own('hoursBaseStep', 'h_base', hour);
export const hoursAcidPass = own('hoursAcidPass', 'h_pass', hour);
export const timeBaseRate = quantity({ key: 'timeBaseRate', symbol: 'k_h,base', unit: currency, cites: [COSTING], is: hoursBaseStep.times(hourPrice) });
export const timePassRate = quantity({ key: 'timePassRate', symbol: 'k_h,pass', unit: currency, cites: [COSTING], is: hoursAcidPass.times(hourPrice) });
