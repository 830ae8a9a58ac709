import type { ENGLISH_CLASS_REPORT } from '../english/class-report.ts';

/** The report of a class, in French. */
export const FRENCH_CLASS_REPORT: Readonly<Record<keyof typeof ENGLISH_CLASS_REPORT, string>> = {
  'class.report': 'Rapport de classe',
  'class.tested-on': 'test passé le {date}',
  'class.table-check': 'code de contrôle du tableau {check}',
  'class.report-check': 'code de contrôle du rapport {check}',
  'class.continued': '{title} (suite)',

  'class.table-lead': 'Tableau.',
  'class.table-cited': 'Publié dans : {source}.',
  'class.group-and-count': '{group} ({count})',
  'class.rank-lead': 'Rang centile.',
  'class.rank-midpoint':
    'Combien sur 100 {people} ont, dans {the-group}, un score {worse} ; ceux qui ont le même score comptent pour moitié.',
  'class.rank-at-or-below': 'Combien sur 100 {people} ont, dans {the-group}, le même score ou un score {worse}.',
  'class.rank-below': 'Combien sur 100 {people} ont, dans {the-group}, un score {worse}.',
  'class.rank-plotting-position':
    'Combien sur 100 {people} ont, dans {the-group}, un score {worse} ; ceux qui ont le même score comptent en partie.',
  'class.rank-grouped':
    'Combien sur 100 {people} ont, dans {the-group}, un score {worse} ; ceux dont le score est dans le même intervalle comptent en partie.',
  'class.rank-unknown':
    'Combien sur 100 {people} ont, dans {the-group}, un score {worse} ; le tableau ne dit pas comment les scores égaux sont comptés.',
  'class.the-norm-group': 'le groupe de référence',
  'class.the-sample': 'l’échantillon',
  'class.lower': 'plus bas',
  'class.higher': 'plus élevé',
  'class.low-is-good': 'Dans ce test, un score bas est bon.',
  'class.band-lead': 'Bande.',
  'class.band-text':
    'Tout score a une erreur de mesure. La bande en tient compte : pour environ {level} {people} sur 100, une bande ainsi faite contient le résultat qu’ils auraient en moyenne à de nombreux tests de ce type (fidélité {reliability}).',
  'class.band-missing':
    'Aucune bande n’est imprimée, car le tableau n’indique pas de fidélité. Tout score a pourtant une erreur de mesure : chaque rang est moins sûr qu’un seul nombre ne le laisse croire.',

  'class.column-name': 'Nom',
  'class.column-code': 'Code',
  'class.column-group': 'Groupe',
  'class.column-table': 'Tableau',
  'class.column-status': 'État',
  'class.column-score': 'Score\nbrut',
  'class.column-rank': 'Rang\ncentile',
  'class.column-band': 'Bande',
  'class.nobody': 'Personne dans la liste n’a de score dont on puisse rendre compte.',
  'class.chart-caption':
    'Figure : un point pour le rang centile sur une échelle de 1 à 99. L’échelle suit la courbe normale (équivalents de la courbe normale), car les rangs sont serrés au milieu, où quelques points de score brut les déplacent beaucoup. Un cercle vide indique un rang inférieur à 1 ou supérieur à 99.',
  'class.chart-caption-band':
    'Figure : un point pour le rang centile et une barre pour sa bande, sur une échelle de 1 à 99. L’échelle suit la courbe normale (équivalents de la courbe normale), car les rangs sont serrés au milieu, où quelques points de score brut les déplacent beaucoup. Un cercle vide indique un rang inférieur à 1 ou supérieur à 99 ; une barre sans trait à son bout sort de l’échelle.',
  'class.chart-alt': 'Rangs centiles sur une même échelle de 1 à 99.',
  'class.chart-alt-band': 'Rangs centiles et bandes sur une même échelle de 1 à 99.',
  'class.chart-alt-row': '{name} : {rank}.',
  'class.chart-alt-row-band': '{name} : {rank}, bande {band}.',
  'class.absent': 'Absents ({count}) :',
  'class.not-tested': 'Non testés ({count}) :',
  'class.excused': 'Dispensés ({count}) :',
  'class.left-out': 'Laissés de côté ({count}) :',
  'class.open': 'Sans réponse encore ({count}) :',
  'class.corrected': 'Score saisi à nouveau ({count}) :',
  'class.name-and-why': '{name} ({why})',
  'class.left-out-code': 'laissé de côté par une réponse sur la liste',
  'class.open-code': 'une question sur la liste est ouverte',

  'class.sheet-class': 'Classe',
  'class.sheet-groups': 'Groupes',
  'class.sheet-summary': 'Résumé',
  'class.sheet-about': 'À propos',

  'class.count-listed': 'Dans la liste',
  'class.count-reported': 'Avec un résultat',
  'class.count-absent': 'Absents',
  'class.count-not-tested': 'Non testés',
  'class.count-excused': 'Dispensés',
  'class.count-left-out': 'Laissés de côté',
  'class.count-open': 'Sans réponse encore',
  'class.counts-heading': 'Qui figure dans ce rapport',
  'class.counted': 'Qui',
  'class.count': 'Nombre',
  'class.scores-heading': 'Scores bruts de la classe',
  'class.place': 'Place dans la classe',
  'class.score': 'Score brut',
  'class.lowest': 'Le plus bas',
  'class.lower-hinge': 'Charnière inférieure',
  'class.median': 'Médiane',
  'class.upper-hinge': 'Charnière supérieure',
  'class.highest': 'Le plus élevé',
  'class.box-caption':
    'La boîte va d’une charnière à l’autre et contient ainsi la moitié centrale de la classe ; le trait qui la coupe est la médiane, les lignes s’arrêtent au score le plus bas et au plus élevé. Chaque point est un résultat de la classe.',
  'class.box-alt': 'Boîte à moustaches des scores bruts : {numbers}.',
  'class.scores-listed': 'Une boîte à moustaches demande au moins cinq scores. Les scores sont : {scores}.',
  'class.quarters-heading': 'Où se situe la classe dans le groupe de référence',
  'class.quarters-heading-sample': 'Où se situe la classe dans l’échantillon',
  'class.quarter-ranks': 'Rangs centiles',
  'class.quarter-count': 'Dans la classe',
  'class.quarters-expected':
    'Le trait gris est un quart de {n}, soit {expected}. Dans {the-group}, environ un quart a un rang dans chacun de ces intervalles. Une classe est petite et n’est pas tirée au sort : quelques-uns de plus ou de moins ne disent rien par eux-mêmes.',
  'class.quarters-alt': '{counts}. Un quart de {n} est {expected}.',
  'class.quarter-alt': 'rangs {ranks} : {count}',
  'class.compared-heading': 'Groupes dans la classe',
  'class.compared-group': 'Groupe',
  'class.compared-n': 'n',
  'class.compared-median': 'Médiane des\nscores bruts',
  'class.compared-mean': 'Moyenne des\nscores bruts',
  'class.compared-nce': 'Moyenne\ndes ECN',
  'class.compared-note':
    'Les groupes sont comparés par leurs scores bruts et par les équivalents de la courbe normale (ECN), dont les pas sont égaux. Un tiret : aucune moyenne n’est donnée pour moins de deux résultats, ni pour les ECN s’il en manque un. Des écarts entre groupes aussi petits peuvent être dus au hasard.',
  'class.no-mean-lead': 'Pas de rang moyen.',
  'class.no-mean':
    'On ne fait pas la moyenne des rangs centiles : leurs pas sont inégaux, et leur moyenne n’est le rang de rien. Le score brut moyen de la classe n’est pas non plus cherché dans le tableau, qui situe des {people} un à un, et non des classes entières.',
  'class.read-lead': 'Comment le lire.',
  'class.read':
    'Le score brut est ce qui a été compté au test ; le rang centile est sa place dans {the-group}. Comparez les bandes plutôt que les rangs : là où deux bandes se recouvrent, le test ne distingue pas avec certitude ces {people}.',
  'class.read-no-band':
    'Le score brut est ce qui a été compté au test ; le rang centile est sa place dans {the-group}. De petits écarts entre rangs, surtout au milieu de l’échelle, restent dans l’erreur du test.',
  'class.cautions-lead': 'Attention.',
  'class.cautions':
    'Un rang centile n’est ni un pourcentage de bonnes réponses ni une note. Il vaut pour cette forme du test, cette période et ce groupe. Aucune décision sur qui que ce soit ne peut reposer sur un seul score ; suivez les règles locales et l’avis de personnes qualifiées.',
  'class.private-lead': 'Qui peut le voir.',
  'class.private-names':
    'Ce rapport contient des noms. Gardez-le comme un carnet de notes et ne le donnez qu’à ceux qui peuvent le voir.',
  'class.private-codes':
    'Des codes remplacent les noms, dans un ordre tiré au sort. Gardez la clé à part de ce rapport ; avec elle, ou avec ce que l’on sait déjà, on peut retrouver à qui est chaque résultat.',

  'class.summary-lead': 'Résumé.',
  'class.summary-all': 'Ce résumé ne nomme personne, et tous ses effectifs sont donnés.',
  'class.summary-hidden':
    'Ce résumé ne nomme personne. Les effectifs inférieurs à {least} sont masqués, de même que tout effectif dont on pourrait en déduire un ; « masqué » peut valoir n’importe quel nombre.',
  'class.summary-class-only':
    'Les effectifs par groupe ne sont pas donnés, car tous les groupes ne sont pas assez grands pour y masquer les effectifs inférieurs à {least}.',
  'class.summary-nothing':
    'Ce résumé ne nomme personne et ne donne aucun effectif : ce que l’on masquerait pour cacher les effectifs inférieurs à {least} pourrait se déduire du reste.',
  'class.summary-again':
    'Ne le diffusez qu’une fois : s’il est refait après une arrivée, un départ ou un test passé plus tard, l’écart entre les deux peut en dire trop sur cette personne.',
  'class.summary-ends': 'Le score le plus bas et le plus élevé ne sont pas donnés, car chacun est celui de quelqu’un.',
  'class.summary-not-tested': 'Non\ntestés',
  'class.hidden': 'masqué',
  'class.summary-heading': 'La classe par rangs centiles',
  'class.summary-ranks': 'Rangs\n{ranks}',
  'class.summary-tested': 'Avec un\nrésultat',
  'class.summary-total': 'Dans\nla liste',
  'class.summary-whole': 'Toute la classe',
  'class.summary-no-group': 'Sans groupe',
};
