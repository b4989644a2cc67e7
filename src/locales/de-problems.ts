import { deBatchProblems } from './de-batch-quantities.js';

/** Why a figure cannot be used, and what to do about it. */
export const deProblems = {
  ambiguous: '„{typed}“ lässt sich auf zwei Arten lesen. Welche ist gemeint?',
  'two-marks': '„{typed}“ hat mehr als ein Dezimalzeichen. Nur ein Komma oder einen Punkt eingeben.',
  'not-a-number': '„{typed}“ ist keine Zahl. Nur Ziffern eingeben, zum Beispiel 3,72.',
  'has-unit': '„{typed}“ enthält die Einheit. Nur die Zahl eingeben; die Einheit steht neben dem Feld.',
  exponent: '„{typed}“ enthält eine Zehnerpotenz. Die Zahl ausschreiben.',
  'too-many-digits': 'Mehr Stellen, als eine Waage anzeigt: höchstens 34 werden gelesen. Die Zahl runden.',
  'unknown-unit': 'Die Einheit „{unit}“ ist hier nicht bekannt. Eine der angebotenen wählen.',
  'unit-does-not-fit': '„{unit}“ passt hier nicht; verlangt ist {needed}. Eine andere Einheit wählen.',
  'not-above-zero': 'Der Wert muss größer als null sein. Die Ablesung prüfen.',
  negative: 'Der Wert kann nicht negativ sein. Das Minuszeichen entfernen.',
  'out-of-range': 'Außerhalb des Möglichen: Die Grenze liegt bei {bound} {unit}. Zahl und Einheit prüfen.',
  'above-100-percent': 'Mehr als 100 %. Zahl und Einheit prüfen.',
  'end-below-start': 'Das Ende liegt unter dem Start. Eine Bürette zählt nach unten: beide Werte prüfen, auch auf Vertauschung.',
  'titre-not-above-blank': 'Der Verbrauch liegt nicht über dem Blindwert, es ergäbe sich keine Säure. Beide Ablesungen und den Blindwert prüfen.',
  'ffa-above-100': 'Das ergibt mehr als 100 % freie Fettsäuren. Probe und Ablesungen prüfen, ebenso, ob der Gehalt der Maßlösung in mol/L oder g/L gilt.',
  'blank-with-neutralised-solvent': 'Neutralisiertes Lösemittel hat keinen Blindwert: Wird dennoch einer abgezogen, fällt der Säuregehalt zu niedrig aus. Den Blindwert leeren oder „Blindwert abgezogen“ wählen.',
  'below-stoichiometric': 'Die Reaktion selbst verbraucht {bound} mol Methanol je mol Öl. Mehr einsetzen.',
  'above-boiling-point': 'Methanol siedet bei {bound} °C. Darunter bleiben.',
  'nothing-left-as-glyceride': 'Säure, Wasser und Unlösliches lassen kein Glycerid übrig. Wasser, Unlösliches und Titration prüfen.',
  'acid-above-saponification': 'Die Säurezahl liegt über der Verseifungszahl, das ist nicht möglich. Beide prüfen.',
  'division-by-zero': 'Nicht berechenbar: Ein Teiler ist null. Die zugrunde liegenden Werte prüfen.',
  'root-of-negative': 'Aus diesen Werten nicht berechenbar. Die zugrunde liegenden Werte prüfen.',
  'logarithm-of-nothing': 'Aus diesen Werten nicht berechenbar. Die zugrunde liegenden Werte prüfen.',
  'not-finite': 'Mit diesen Werten wächst das Ergebnis über alle Grenzen. Die zugrunde liegenden Werte prüfen.',
  'unknown-option': '„{option}“ gehört nicht zur Auswahl. Eine der angebotenen Möglichkeiten wählen.',
  ...deBatchProblems,
  other: 'Dieser Wert ist nicht verwendbar ({code}). Den Wert prüfen.',
};

/** Why a document cannot be read. */
export const deFaults = {
  title: 'Diese Partie lässt sich nicht lesen.',
  'not-an-object': 'Es ist kein Eintrag einer Partie.',
  'newer-version': 'Sie stammt aus einer neueren Version ({found}). Die Seite aktualisieren oder die Partie dort öffnen, wo sie geschrieben wurde.',
  'unknown-version': 'Es ist keine bekannte Version angegeben.',
  'unknown-key': '„{path}“ ist hier nicht bekannt.',
  'wrong-type': '„{path}“ ist nicht von der erwarteten Art.',
  'too-long': '„{path}“ ist zu lang.',
  'unknown-option': '„{found}“ steht bei „{path}“ nicht zur Wahl.',
};
