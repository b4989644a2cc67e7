// The mass balance of a lot; knows no page.

export { balance } from './lot/balance.js';
export type { Balance, BalanceFlow, BalanceLayer, BalanceStep, NoBalance, Weighed } from './lot/balance.js';
export type { Component, StepName, Stream } from './chemistry/balance-steps.js';
