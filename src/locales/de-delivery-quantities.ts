/** Deutsche Namen für das, was ein Betrieb von einer Anlieferung verlangt, und für ihre Abrechnung. */
export const deDeliveryQuantities = {
  blendingLimit: 'höchste FFA zum Verschneiden',
  acceptedWater: 'höchster Wassergehalt einer Anlieferung',
  acceptedInsolubles: 'höchster Gehalt an Unlöslichem einer Anlieferung',
  arrivalTemperature: 'Temperatur bei Ankunft',
  lowestArrival: 'niedrigste Temperatur bei Ankunft',
  highestArrival: 'höchste Temperatur bei Ankunft',
  'settlement.baseFfa': 'Basis-FFA des Vertrags',
  'settlement.waterAllowance': 'Wasser, das der Vertrag zulässt',
  'settlement.insolublesAllowance': 'Unlösliches, das der Vertrag zulässt',
  'settlement.ffaRate': 'Abzug je % FFA',
  'settlement.waterRate': 'Abzug je % Wasser',
  'settlement.insolublesRate': 'Abzug je % Unlösliches',
  'settlement.mass': 'bezahlte Masse',
  'settlement.ffaDeduction': 'Abzug für FFA',
  'settlement.waterDeduction': 'Abzug für Wasser',
  'settlement.insolublesDeduction': 'Abzug für Unlösliches',
  'settlement.price': 'Preis nach Abzügen',
  'settlement.amount': 'Zahlung für die Anlieferung',
};

export const deDeliveryChoices = {
  takesOneRun: 'Annahme nach einer Bestimmung',
  takesCertificate: 'Annahme nach Zertifikat',
  waterAbove: 'Über dem höchsten Wassergehalt',
  insolublesAbove: 'Über dem höchsten Unlöslichen',
  settledBy: 'Bezahlt wird',
};

export const deDeliveryOptions = {
  takesOneRun: { yes: 'ja', no: 'nein, bis zur zweiten zurückstellen' },
  takesCertificate: { yes: 'ja', no: 'nein, bis zur Titration zurückstellen' },
  waterAbove: { hold: 'zurückstellen', decline: 'ablehnen' },
  insolublesAbove: { hold: 'zurückstellen', decline: 'ablehnen' },
  settledBy: { 'as-delivered': 'die Ladung wie geliefert', 'without-water-and-insolubles': 'die Ladung ohne Wasser und Unlösliches' },
};
