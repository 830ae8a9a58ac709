import type { ENGLISH_CLASS_REPORT } from '../english/class-report.ts';

/** The group of the table stands in the genitive or the dative: "in der Normstichprobe". */
export const GERMAN_CLASS_REPORT: Readonly<Record<keyof typeof ENGLISH_CLASS_REPORT, string>> = {
  'class.report': 'Klassenbericht',
  'class.tested-on': 'getestet am {date}',
  'class.table-check': 'Prüfcode der Tabelle {check}',
  'class.report-check': 'Prüfcode des Berichts {check}',
  'class.continued': '{title} (Fortsetzung)',

  'class.table-lead': 'Tabelle.',
  'class.table-cited': 'Veröffentlicht in: {source}.',
  'class.group-and-count': '{group} ({count})',
  'class.rank-lead': 'Prozentrang.',
  'class.rank-midpoint':
    'Wie viele es in {the-group} auf je 100 {people} mit einem {worse} Ergebnis gibt; wer dasselbe Ergebnis hat, zählt zur Hälfte mit.',
  'class.rank-at-or-below':
    'Wie viele es in {the-group} auf je 100 {people} mit demselben oder einem {worse} Ergebnis gibt.',
  'class.rank-below': 'Wie viele es in {the-group} auf je 100 {people} mit einem {worse} Ergebnis gibt.',
  'class.rank-plotting-position':
    'Wie viele es in {the-group} auf je 100 {people} mit einem {worse} Ergebnis gibt; wer dasselbe Ergebnis hat, zählt zum Teil mit.',
  'class.rank-grouped':
    'Wie viele es in {the-group} auf je 100 {people} mit einem {worse} Ergebnis gibt; wer ein Ergebnis aus derselben Ergebnisklasse hat, zählt zum Teil mit.',
  'class.rank-unknown':
    'Wie viele es in {the-group} auf je 100 {people} mit einem {worse} Ergebnis gibt; die Tabelle sagt nicht, wie gleiche Ergebnisse gezählt werden.',
  'class.the-norm-group': 'der Normstichprobe',
  'class.the-sample': 'der Stichprobe',
  'class.lower': 'niedrigeren',
  'class.higher': 'höheren',
  'class.low-is-good': 'In diesem Test ist ein niedriger Wert gut.',
  'class.band-lead': 'Band.',
  'class.band-text':
    'Jedes Ergebnis hat einen Messfehler. Das Band berücksichtigt ihn: Auf je 100 {people} kommen etwa {level}, bei denen ein so gebildetes Band das Ergebnis enthält, das sie im Mittel über viele Tests dieser Art hätten (Reliabilität {reliability}).',
  'class.band-missing':
    'Ein Band wird nicht gedruckt, weil die Tabelle keine Reliabilität angibt. Trotzdem hat jedes Ergebnis einen Messfehler: Jeder Prozentrang ist weniger sicher, als eine einzelne Zahl aussieht.',

  'class.column-name': 'Name',
  'class.column-code': 'Code',
  'class.column-group': 'Gruppe',
  'class.column-table': 'Tabelle',
  'class.column-status': 'Stand',
  'class.column-score': 'Rohwert',
  'class.column-rank': 'Prozent-\nrang',
  'class.column-band': 'Band',
  'class.nobody': 'Niemand in der Liste hat ein Ergebnis, über das berichtet werden kann.',
  'class.chart-caption':
    'Bild: ein Punkt für den Prozentrang auf einer Skala von 1 bis 99. Die Abstände folgen der Normalverteilung (Normalkurven-Äquivalente), weil die Prozentränge in der Mitte dicht liegen: Dort ändern wenige Rohpunkte sie stark. Ein Ring steht für einen Prozentrang unter 1 oder über 99.',
  'class.chart-caption-band':
    'Bild: ein Punkt für den Prozentrang und ein Balken für sein Band auf einer Skala von 1 bis 99. Die Abstände folgen der Normalverteilung (Normalkurven-Äquivalente), weil die Prozentränge in der Mitte dicht liegen: Dort ändern wenige Rohpunkte sie stark. Ein Ring steht für einen Prozentrang unter 1 oder über 99; ein Balken ohne Strich am Ende reicht über die Skala hinaus.',
  'class.chart-alt': 'Prozentränge auf einer gemeinsamen Skala von 1 bis 99.',
  'class.chart-alt-band': 'Prozentränge und Bänder auf einer gemeinsamen Skala von 1 bis 99.',
  'class.chart-alt-row': '{name}: {rank}.',
  'class.chart-alt-row-band': '{name}: {rank}, Band {band}.',
  'class.absent': 'Gefehlt ({count}):',
  'class.not-tested': 'Nicht getestet ({count}):',
  'class.excused': 'Befreit ({count}):',
  'class.left-out': 'Weggelassen ({count}):',
  'class.open': 'Noch nicht beantwortet ({count}):',
  'class.corrected': 'Ergebnis neu eingegeben ({count}):',
  'class.name-and-why': '{name} ({why})',
  'class.left-out-code': 'nach einer Rückfrage zur Liste weggelassen',
  'class.open-code': 'eine Rückfrage zur Liste ist offen',

  'class.sheet-class': 'Klasse',
  'class.sheet-groups': 'Gruppen',
  'class.sheet-summary': 'Zusammenfassung',
  'class.sheet-about': 'Grundlagen',

  'class.count-listed': 'In der Liste',
  'class.count-reported': 'Mit Ergebnis',
  'class.count-absent': 'Gefehlt',
  'class.count-not-tested': 'Nicht getestet',
  'class.count-excused': 'Befreit',
  'class.count-left-out': 'Weggelassen',
  'class.count-open': 'Noch nicht beantwortet',
  'class.counts-heading': 'Wer in diesem Bericht steht',
  'class.counted': 'Wer',
  'class.count': 'Anzahl',
  'class.scores-heading': 'Rohwerte der Klasse',
  'class.place': 'Stelle in der Klasse',
  'class.score': 'Rohwert',
  'class.lowest': 'Niedrigster',
  'class.lower-hinge': 'Unterer Angelpunkt',
  'class.median': 'Median',
  'class.upper-hinge': 'Oberer Angelpunkt',
  'class.highest': 'Höchster',
  'class.box-caption':
    'Der Kasten reicht von Angelpunkt zu Angelpunkt und umfasst so die mittlere Hälfte der Klasse; der Strich darin ist der Median, die Linien enden beim niedrigsten und beim höchsten Rohwert. Jeder Punkt ist ein Ergebnis aus der Klasse.',
  'class.box-alt': 'Kastenbild der Rohwerte: {numbers}.',
  'class.scores-listed': 'Ein Kastenbild braucht mindestens fünf Ergebnisse. Die Rohwerte sind: {scores}.',
  'class.quarters-heading': 'Wo die Klasse in der Normstichprobe steht',
  'class.quarters-heading-sample': 'Wo die Klasse in der Stichprobe steht',
  'class.quarter-ranks': 'Prozentränge',
  'class.quarter-count': 'In der Klasse',
  'class.quarters-expected':
    'Der graue Strich ist ein Viertel von {n}, also {expected}. In {the-group} liegt etwa je ein Viertel in diesen Bereichen. Eine Klasse ist klein und nicht ausgelost; einige mehr oder weniger sagen für sich allein nichts.',
  'class.quarters-alt': '{counts}. Ein Viertel von {n} ist {expected}.',
  'class.quarter-alt': 'Prozentränge {ranks}: {count}',
  'class.compared-heading': 'Gruppen in der Klasse',
  'class.compared-group': 'Gruppe',
  'class.compared-n': 'n',
  'class.compared-median': 'Median der\nRohwerte',
  'class.compared-mean': 'Mittelwert der\nRohwerte',
  'class.compared-nce': 'Mittelwert\nder NCE',
  'class.compared-note':
    'Gruppen werden nach Rohwerten und nach Normalkurven-Äquivalenten (NCE) verglichen, deren Schritte gleich sind. Ein Strich: Bei weniger als zwei Ergebnissen wird kein Mittelwert gebildet, und keiner der NCE, wenn eines fehlt. Unterschiede zwischen so kleinen Gruppen können Zufall sein.',
  'class.no-mean-lead': 'Kein mittlerer Prozentrang.',
  'class.no-mean':
    'Prozentränge werden nicht gemittelt: Ihre Schritte sind ungleich, ihr Mittelwert ist kein Prozentrang. Auch der mittlere Rohwert der Klasse wird nicht in der Tabelle nachgeschlagen, denn sie ordnet einzelne {people} ein, nicht ganze Klassen.',
  'class.read-lead': 'So wird es gelesen.',
  'class.read':
    'Der Rohwert ist, was im Test gezählt wurde; der Prozentrang ist sein Platz in {the-group}. Vergleichen Sie eher Bänder als Prozentränge: Wo zwei Bänder sich überschneiden, kann der Test die {people} nicht sicher unterscheiden.',
  'class.read-no-band':
    'Der Rohwert ist, was im Test gezählt wurde; der Prozentrang ist sein Platz in {the-group}. Kleine Unterschiede zwischen Prozenträngen, vor allem in der Mitte der Skala, liegen innerhalb des Messfehlers.',
  'class.cautions-lead': 'Bitte beachten.',
  'class.cautions':
    'Ein Prozentrang ist kein Prozentsatz richtiger Antworten und keine Note. Er gilt für diese Testform, diesen Zeitpunkt und diese Gruppe. Keine Entscheidung über einen Menschen darf auf einem einzigen Ergebnis beruhen; beachten Sie die örtlichen Regeln und das Urteil von Fachleuten.',
  'class.private-lead': 'Wer ihn sehen darf.',
  'class.private-names':
    'Dieser Bericht enthält Namen. Verwahren Sie ihn wie ein Notenbuch, und geben Sie ihn nur an Personen weiter, die ihn sehen dürfen.',
  'class.private-codes':
    'Codes stehen für Namen, in ausgeloster Reihenfolge. Verwahren Sie den Schlüssel getrennt von diesem Bericht; mit ihm oder mit dem, was jemand schon weiß, lassen sich Ergebnisse den Namen zuordnen.',

  'class.summary-lead': 'Zusammenfassung.',
  'class.summary-all': 'Diese Zusammenfassung nennt niemanden, und alle Anzahlen sind angegeben.',
  'class.summary-hidden':
    'Diese Zusammenfassung nennt niemanden. Anzahlen unter {least} sind verdeckt, ebenso jede Anzahl, aus der sich eine solche errechnen ließe; „verdeckt“ kann für jede Zahl stehen.',
  'class.summary-class-only':
    'Anzahlen nach Gruppen fehlen, weil nicht alle Gruppen groß genug sind, um Anzahlen unter {least} in ihnen zu verdecken.',
  'class.summary-nothing':
    'Diese Zusammenfassung nennt niemanden und gibt keine Anzahlen an: Was verdeckt würde, damit keine Anzahl unter {least} zu sehen ist, ließe sich aus dem Rest errechnen.',
  'class.summary-again':
    'Geben Sie sie nur einmal weiter: Entsteht sie neu, nachdem jemand hinzugekommen, weggegangen oder später getestet worden ist, kann der Unterschied etwas über diese Person verraten.',
  'class.summary-ends':
    'Der niedrigste und der höchste Rohwert werden nicht genannt, denn jeder gehört zu einer bestimmten Person.',
  'class.summary-not-tested': 'Nicht\ngetestet',
  'class.hidden': 'verdeckt',
  'class.summary-heading': 'Die Klasse nach Prozenträngen',
  'class.summary-ranks': 'Ränge\n{ranks}',
  'class.summary-tested': 'Mit\nErgebnis',
  'class.summary-total': 'In der\nListe',
  'class.summary-whole': 'Ganze Klasse',
  'class.summary-no-group': 'Ohne Gruppe',
};
