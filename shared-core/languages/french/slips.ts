import type { ENGLISH_SLIPS } from '../english/slips.ts';

/** The slip that goes home with a pupil, in French. */
export const FRENCH_SLIPS: Readonly<Record<keyof typeof ENGLISH_SLIPS, string>> = {
  'slip.title': '{class} · Feuilles de résultats',
  'slip.test': '{test}, test passé le {date}',
  'slip.score-label': 'Score',
  'slip.rank-label': 'Rang centile',
  'slip.band-label': 'Bande',

  'slip.means': 'Ce que veut dire ce résultat',
  'slip.score': '{name} a obtenu un score de {score} sur une échelle de {lowest} à\u00a0{highest}.',
  'slip.low-is-good': 'Dans ce test, un score bas est bon.',
  'slip.group': 'Il est comparé aux scores d’autres {people} : {group}.',
  'slip.population': 'Ils représentent : {population}.',
  'slip.rank-midpoint':
    'Sur 100 d’entre eux, on en compte {share} avec un score {worse} : c’est le rang centile. (Ceux qui ont exactement le même score comptent pour moitié.)',
  'slip.rank-at-or-below':
    'Sur 100 d’entre eux, on en compte {share} avec le même score ou un score {worse} : c’est le rang centile.',
  'slip.rank-below': 'Sur 100 d’entre eux, on en compte {share} avec un score {worse} : c’est le rang centile.',
  'slip.rank-plotting-position':
    'Sur 100 d’entre eux, on en compte {share} avec un score {worse} : c’est le rang centile. (Ceux qui ont exactement le même score comptent en partie.)',
  'slip.rank-grouped':
    'Sur 100 d’entre eux, on en compte {share} avec un score {worse} : c’est le rang centile. (Ceux qui ont le même score, ou un score proche, comptent en partie.)',
  'slip.rank-unknown':
    'Sur 100 d’entre eux, on en compte {share} avec un score {worse} : c’est le rang centile. (On ne sait pas comment sont comptés ceux qui ont exactement le même score.)',
  'slip.share-about': 'environ {rank}',
  'slip.share-below': 'moins de {rank}',
  'slip.share-above': 'plus de {rank}',
  'slip.adjusted': 'Ceux qui ont fait le tableau ont fixé ce rang centile à la main.',
  'slip.band':
    'Aucun test n’est exact. Un autre jour, ou avec d’autres questions du même type, {name} aurait pu obtenir un peu plus ou un peu moins. La bande, {band}, en tient compte : pour environ {level} {people} sur 100, une telle bande contient le résultat qu’ils auraient en moyenne s’ils passaient de nombreux tests de ce type.',
  'slip.no-band':
    'Aucun test n’est exact. Un autre jour, ou avec d’autres questions du même type, {name} aurait pu obtenir un peu plus ou un peu moins. De combien, on ne le sait pas pour ce test.',
  'slip.picture-dot': 'Le point est le rang centile.',
  'slip.picture-ring': 'Le cercle vide indique un rang centile au-delà du bout de l’échelle.',
  'slip.picture-bar': 'La barre est la bande.',
  'slip.picture-scale': '50 est le milieu ; les rangs y sont les plus serrés, car la plupart des scores s’y trouvent.',
  'slip.picture-alt': 'Une échelle de rangs centiles de 1 à 99. Le rang centile est {rank}.',
  'slip.picture-alt-band': 'Une échelle de rangs centiles de 1 à 99. Le rang centile est {rank}, la bande {band}.',

  'slip.means-not': 'Ce qu’il ne veut pas dire',
  'slip.not-per-cent':
    'Ce n’est pas le pourcentage de bonnes réponses. Ce n’est pas une note, et 50 n’est pas une moyenne à atteindre.',
  'slip.not-judgement':
    'Il montre comment s’est passé un test, un jour donné. Il ne juge pas {name} et ne dit pas ce que {name} peut apprendre.',
  'slip.not-alone':
    'Ce que les enseignants et la famille savent par ailleurs compte aussi. Rien ne devrait se décider sur ce seul résultat.',
  'slip.ask':
    'Demandez à l’école si quelque chose n’est pas clair, comment ce résultat est utilisé et quelles règles s’appliquent.',
};
