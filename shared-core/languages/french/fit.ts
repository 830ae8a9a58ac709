import type { ENGLISH_FIT } from '../english/fit.ts';

export const FRENCH_FIT: Readonly<Record<keyof typeof ENGLISH_FIT, string>> = {
  'fit.title': 'Notes techniques sur le lissage',
  'fit.degrees-lead': 'Degrés.',
  'fit.fit-lead': 'Ajustement.',
  'fit.beware-lead': 'Attention.',
  'fit.degree': 'Degré',
  'fit.df': 'ddl',
  'fit.about-degrees':
    'G² et X² disent de combien les effectifs ajustés s’éloignent des effectifs observés. AIC et BIC ajoutent un coût ' +
    'pour chaque paramètre ; moins vaut mieux. p teste un degré contre celui du dessous. Le degré retenu est en gras, ' +
    'au-dessus d’un filet.',
  'fit.none-found': 'Là où il y a des tirets, aucun ajustement n’a été trouvé.',
  'fit.nearly-as-good': 'Aussi bons selon BIC, plus bas ou plus haut de 2 au plus : degré {degrees}.',
  'fit.moment': 'Moment',
  'fit.observed': 'Observé',
  'fit.smoothed': 'Lissé',
  'fit.mean': 'Moyenne',
  'fit.sd': 'Écart type, divisé par n',
  'fit.skewness': 'Asymétrie',
  'fit.excess-kurtosis': 'Excès d’aplatissement',
  'fit.moment-pair': '{moment} : {observed} observé, {smoothed} lissé',
  'fit.misfit': 'G² vaut {g2} et X² {x2}, pour {df} degrés de liberté.',
  'fit.bandwidth': 'La largeur de bande du noyau est de {bandwidth} points de score brut.',
  'fit.bandwidth-found':
    'La largeur de bande du noyau est de {bandwidth} points de score brut, déterminée d’après les données.',
  'fit.largest-move':
    'Le plus grand déplacement d’un rang est de {points} points de rang centile, au score brut {score}.',
  'fit.changed': 'Le lissage change {changed} rangs imprimés sur {of}.',
  'fit.filled-gaps': 'La courbe attend cinq {people} ou plus à {scores}, où il n’y a personne.',
  'fit.invented-dips': 'La courbe a un creux à {scores} ; les données n’en ont pas.',
};
