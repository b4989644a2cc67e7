/** English names of what a site asks of a delivery, and of its settlement. */
export const enDeliveryQuantities = {
  blendingLimit: 'highest FFA taken for blending',
  acceptedWater: 'highest water of a delivery',
  acceptedInsolubles: 'highest insolubles of a delivery',
  arrivalTemperature: 'temperature at arrival',
  lowestArrival: 'lowest temperature at arrival',
  highestArrival: 'highest temperature at arrival',
  'settlement.baseFfa': 'base FFA of the contract',
  'settlement.waterAllowance': 'water allowed by the contract',
  'settlement.insolublesAllowance': 'insolubles allowed by the contract',
  'settlement.ffaRate': 'deduction for each % of FFA',
  'settlement.waterRate': 'deduction for each % of water',
  'settlement.insolublesRate': 'deduction for each % of insolubles',
  'settlement.mass': 'mass paid for',
  'settlement.ffaDeduction': 'deduction for FFA',
  'settlement.waterDeduction': 'deduction for water',
  'settlement.insolublesDeduction': 'deduction for insolubles',
  'settlement.price': 'price after deductions',
  'settlement.amount': 'payment for the delivery',
};

/** Labels of the choices about them. */
export const enDeliveryChoices = {
  takesOneRun: 'Take a delivery on one run',
  takesCertificate: 'Take a delivery on a certificate',
  waterAbove: 'Above the highest water',
  insolublesAbove: 'Above the highest insolubles',
  settledBy: 'Paid for',
};

/** Words for their options. */
export const enDeliveryOptions = {
  takesOneRun: { yes: 'yes', no: 'no, hold it for a second' },
  takesCertificate: { yes: 'yes', no: 'no, hold it for a titration' },
  waterAbove: { hold: 'hold it', decline: 'decline it' },
  insolublesAbove: { hold: 'hold it', decline: 'decline it' },
  settledBy: { 'as-delivered': 'the load as delivered', 'without-water-and-insolubles': 'the load without water and insolubles' },
};
