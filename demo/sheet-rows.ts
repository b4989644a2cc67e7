// Deliveries of the invented plant as its office keeps them: headings in the first row, and here and there what people type.

export const HEADINGS = ['Lot', 'Supplier', 'Date', 'Oil [kg]', 'FFA [%]', 'Water [%]', 'Temp [°C]'] as const;

const SUPPLIERS = ['Kitchen round north', 'Snack fryers', 'Ferry canteens', 'Mill Lane depot'] as const;

/** A repeatable wobble between −1 and 1. */
const wobble = (i: number): number => Math.sin(i * 12.9898) * 0.6 + Math.sin(i * 4.1414) * 0.4;

const usual = (i: number): readonly string[] => {
  const supplier = i % SUPPLIERS.length;
  // the snack fryers' oil has been getting sourer
  const ffa = [1.6, 4.2 + i * 0.09, 2.4, 6.5][supplier]! + wobble(i) * [0.3, 0.5, 0.5, 1.8][supplier]!;
  const day = new Date(Date.UTC(2026, 1, 2 + Math.floor(i * 0.8)));
  return [`QR-${String(301 + i)}`, SUPPLIERS[supplier]!, day.toISOString().slice(0, 10), String(Math.round(900 + wobble(i + 50) * 500)), ffa.toFixed(2), (0.09 + Math.abs(wobble(i + 9)) * 0.08).toFixed(2), String(Math.round(24 + wobble(i + 3) * 6))];
};

/** Rows that a hurried hand left. */
const ODD: Readonly<Record<number, readonly string[]>> = {
  7: ['QR-308', 'Mill Lane depot', '2026-02-07', '1120', 'see note', '0.11', '22'],
  15: ['', '', '', '', '', '', ''],
  22: ['QR-323', 'Ferry canteens', '2026-02-19', '980', '2,35', '0.10', '25'],
  31: ['QR-332', 'Snack fryers', 'Thursday', '1,040', '7.12', '0.14', '27'],
};

export const sheetRows: readonly (readonly string[])[] = [HEADINGS, ...Array.from({ length: 40 }, (_, i) => ODD[i] ?? usual(i))];
