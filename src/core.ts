export { Decimal } from './formula/decimal.js';
