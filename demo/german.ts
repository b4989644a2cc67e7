/** The page's German, by the `data-text` and `data-label` of index.html; its English stands in the page itself. */
export const german: Readonly<Record<string, string>> = {
  title: 'Annahme – Quillmarsh Oil Recovery',
  pages: 'Seiten',
  desk: 'Annahme',
  apart: 'Abschnitte einzeln',
  sheet: 'Neben einer Tabelle',
  script: 'Ein Script-Tag',
  language: 'Sprache',
  units: 'Einheiten',
  metric: 'metrisch',
  us: 'US',
  theme: 'Farben',
  system: 'wie System',
  light: 'hell',
  dark: 'dunkel',
  deliveries: 'Lieferungen heute',
  hint: 'Antippen legt eine Lieferung auf den Arbeitsplatz. Alle Angaben dieser Seite sind erfunden.',
  notice: 'Trockner 2 steht bis Donnerstag',
  'notice.text':
    'Nasse Partien warten in Tank 4, der noch 3,5\u00a0t fasst. Bitte den Wassergehalt jeder Lieferung messen, bevor sie '
    + 'abgepumpt wird, nicht nur bei Verdacht.',
  notes: 'Schichtbuch',
  'note.titrant': 'KOH neu angesetzt und eingestellt: 0,1003\u00a0mol/L. Die alte Flasche ist leer und gespült.',
  'note.stalls': 'Die Fässer von den Imbissständen riechen sauer und fließen zäh. Vor der Probe auf 35\u00a0°C erwärmt.',
  'note.drums':
    'Der Zettel der Fässer ohne Etikett kann nicht stimmen. Neue Probe gezogen; bis dahin die alten Angaben behalten.',
  'note.expected': 'Erwartet: Kantinentour West, acht Fässer. Tor 2.',
};
