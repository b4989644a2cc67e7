/** Giving results to a sheet. */
export const enGiving = {
  title: 'Results for a sheet',
  note: 'This lot as a row with its headings, or as a workbook in which every figure follows from what was typed.',
  nothing: 'There is no result yet. Titrate the lot first.',
  give: 'Give to a sheet',
  target: 'Decimals in that sheet',
  targets: { page: 'as on this page', '.': 'with a point', ',': 'with a comma' },
  copy: 'Copy the results',
  copied: '{rows} rows copied, with their headings.',
  copyByHand: 'This page may not write the clipboard. The rows are in the box below, selected: copy them from there.',
  csv: 'Results as CSV',
  workbook: 'Workbook with live formulas',
  workbookMost: 'A workbook takes at most {most} lots; it has the first {most}.',
  workbookFailed: 'The workbook could not be written: {error}',
};
