import type { Texts } from './en.js';

/** Warum ein Verfahren genannt wird. */
export const deReasons: Texts['reasons'] = {
  'at-or-below-direct-limit': 'FFA {ffa} % hält die Direktgrenze dieses Betriebs von {limit} % ein.',
  'above-direct-limit': 'FFA {ffa} % liegt über der Direktgrenze dieses Betriebs von {limit} %.',
  'above-pretreatment-limit': 'FFA {ffa} % liegt über den {limit} %, bis zu denen hier verestert wird.',
  'within-guard-band': 'FFA {ffa} % liegt höchstens {guard} % neben der Grenze von {limit} %; genannt ist das Verfahren auf der sicheren Seite.',
  'extra-negligible': 'Bis {limit} % ist der Katalysatorzuschlag vernachlässigbar.',
  'no-acid-proof-equipment': 'Laut Betriebsvorgaben ist keine säurefeste Anlage vorhanden.',
  'dry-before-base-step': 'Öl erst trocknen: Wasser {water} % liegt über der Grenze von {limit} % für die Umesterung.',
  'dry-before-acid-step': 'Öl erst trocknen: Wasser {water} % liegt über der Grenze von {limit} % für die Veresterung.',
  'water-not-measured': 'Wasser nicht gemessen: Es gilt der Richtwert {water} %, die Wassergrenze bleibt ungeprüft.',
  'pretreatment-misses-target': 'Auch {passes} Durchgänge lassen voraussichtlich bis zu {left} % FFA, mehr als das Ziel von {target} %.',
  'ffa-not-known': 'Das Verfahren richtet sich nach den freien Fettsäuren.',
  'no-guard-band': 'Ohne Abstand zur Grenze entschieden: Die Unsicherheit des Ergebnisses bleibt offen, solange ein Wert der Ausstattung fehlt oder abgelehnt ist. Betriebsvorgaben prüfen.',
  'runs-differ': 'Die Bestimmungen liegen weiter auseinander als zulässig: erst die Titration klären.',
  'more-runs-settle': 'Weitere Bestimmungen, die Klarheit brächten, wenn das Mittel bleibt: {runs}.',
  'many-runs-settle': 'So nah an der Grenze, dass auch insgesamt {runs} Bestimmungen keine Klarheit brächten.',
  'no-runs-settle': 'Weitere Bestimmungen helfen nicht: Was bleibt, kommt vor allem hierher: {source}.',
};

/** Hinweise zu Werten, die möglich sind und doch einen zweiten Blick verdienen. */
export const deNotices: Texts['notices'] = {
  'one-run': 'Einfachbestimmung, durch keine zweite bestätigt.',
  'run-incomplete': 'Bestimmung {run} ist unvollständig und zählt noch nicht.',
  'runs-tenfold': 'Eine Bestimmung ergibt ein Mehrfaches der anderen: Kommastellen von Probe und Bürette prüfen.',
  'target-not-reached': 'Auch {passes} Durchgänge lassen voraussichtlich bis zu {left} % FFA.',
  'lauric-on-other-basis': 'Kokosartiges Fett, auf eine andere Säure berechnet: Laurinsäure wählen.',
  'titre-small': 'Bestimmung {run}: nur {titre} mL, ein Tropfen fällt stark ins Gewicht. Mehr Probe oder schwächere Maßlösung nehmen.',
  'titre-above-burette': 'Bestimmung {run}: Die Bürette fasst {capacity} mL. Weniger Probe oder stärkere Maßlösung nehmen, oder die Bürette in den Betriebsvorgaben ändern.',
  'portion-unusual': 'Bestimmung {run}: Bei einer Säurezahl um {acidValue} sieht die Methode etwa {wanted} g vor, nicht {mass} g. Einwaage prüfen oder neu einwägen.',
  'strength-perhaps-grams': '{strength} mol/L sind ungewöhnlich; der Wert passt zu g/L. Einheit prüfen.',
  'strength-perhaps-moles': '{strength} g/L sind ungewöhnlich; der Wert passt zu mol/L. Einheit prüfen.',
  'strength-unlikely': '{strength} mol/L sind ungewöhnlich: Maßlösungen liegen zwischen 0,01 und 1,5 mol/L. Wert und Einheit prüfen.',
  'blank-large': 'Der Blindwert macht {share} % des Verbrauchs aus. Lösemittel neutralisieren oder frisches nehmen.',
  'titrant-old': 'Titer vor {days} Tagen gestellt; zulässig sind hier {limit}. Neu stellen.',
  'titrant-age-unknown': 'Der Tag der Titerstellung fehlt, das Alter der Maßlösung bleibt ungeprüft. Datum angeben.',
  'titrant-not-standardised': 'Maßlösung nur eingewogen, Titer nicht gestellt: ihr Gehalt ist unsicher. Gegen KHP stellen.',
  'standardisation-differs': 'Die {runs} Titerstellungen liegen {range} mol/L auseinander; höchstens {critical} sind zulässig. Eine weitere machen oder eine falsche mit Grund streichen.',
  'purity-as-fraction': 'Reinheit als Bruchteil? Üblich wären {meant} %. In Prozent angeben.',
  'date-in-future': 'Dieser Tag liegt in der Zukunft. Datum prüfen.',
  'temperature-not-corrected': 'Die Maßlösung wich um {gap} °C von der Temperatur der Titerstellung ab, und hier wird nicht korrigiert. Temperieren oder korrigieren.',
  'batch-above-vessel': 'Der Ansatz von {volume} L übersteigt die {working} L, bis zu denen der Behälter gefüllt wird. Partie teilen.',
  'batch-too-wet': 'Das Wasser im Ansatz macht {water} % des Öls aus, mehr als hier zulässig ({limit} %): weniger Ester, mehr Seife. Öl trocknen oder ein Methylat nehmen.',
  'soap-above-limit': 'Die Seife macht {soap} % des Öls aus, mehr als hier zulässig ({limit} %): die Schichten trennen sich kaum. Zweistufig arbeiten oder verschneiden.',
  'retest-higher': 'Die Nachtitration mit {after} % FFA liegt über den {before} % vor der Veresterung, die keine Säure bildet. Prüfen, ob beide vertauscht sind; Mineralsäure im Öl titriert mit: länger absetzen lassen und eine frische Probe ziehen.',
  'methanol-little-for-catalyst': '{load} g Katalysator je Liter Methanol liegen nahe oder über den {solubility} g, die sich lösen. Mehr Methanol oder eine Lösung nehmen.',
};

/** Was aus den Bestimmungen wurde, und der nächste Schritt. */
export const deReplicates: Texts['replicates'] = {
  agree: 'Mittel aus {runs} Bestimmungen: Spannweite {range} mg/g, zulässig {critical}.',
  differMean: 'Vorläufig Mittel aus {runs} Bestimmungen: Spannweite {range} mg/g, zulässig sind nur {critical}.',
  differMedian: 'Median aus {runs} Bestimmungen: Spannweite {range} mg/g, zulässig sind nur {critical}.',
  next: {
    'second-run': 'Nächster Schritt: zweite Bestimmung.',
    'one-more': 'Nächster Schritt: eine weitere Bestimmung.',
    'two-more': 'Nächster Schritt: zwei weitere Bestimmungen.',
    'look-for-cause': 'Nächster Schritt: Ursache bei Probenahme, Maßlösung oder Endpunkt suchen, dann neu beginnen. Eine als falsch erkannte Bestimmung mit Grund streichen.',
  },
};
