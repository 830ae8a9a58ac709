import type { ENGLISH_RECIPE } from '../english/recipe.ts';

export const FRENCH_RECIPE: Readonly<Record<keyof typeof ENGLISH_RECIPE, string>> = {
  'recipe.take': 'Prendre {people} ({group}) et le score brut {score}.',
  'recipe.take-weighted':
    'Prendre {people} ({group}), dont les poids font {weight} au total, et le score brut {score}.',
  'recipe.count-lower': 'Compter ceux qui ont un score inférieur : {worse}. Compter ceux qui ont ce score : {same}.',
  'recipe.count-higher': 'Compter ceux qui ont un score supérieur : {worse}. Compter ceux qui ont ce score : {same}.',
  'recipe.weigh-lower':
    'Additionner les poids de ceux qui ont un score inférieur : {worse} ; et de ceux qui ont ce score : {same}.',
  'recipe.weigh-higher':
    'Additionner les poids de ceux qui ont un score supérieur : {worse} ; et de ceux qui ont ce score : {same}.',
  'recipe.add-half': 'Ajouter la moitié du second nombre au premier : {sum}.',
  'recipe.add-both': 'Additionner les deux nombres : {sum}.',
  'recipe.keep-first': 'Ne garder que le premier nombre : {sum}.',
  'recipe.divide': 'Diviser par {all} et multiplier par 100 : {rank}.',
  'recipe.mean-rank': 'Ajouter la moitié du second nombre au premier, puis 1/2 : le rang moyen r est {mean}.',
  'recipe.mean-rank-scaled':
    'Ajouter la moitié du second nombre au premier, multiplier par {factor}, puis ajouter 1/2 : le rang moyen r est {mean}.',
  'recipe.plotting-position': 'Avec a = {offset}, 100 (r − a)/({count} + 1 − 2a) vaut {rank} (borné entre 0 et 100).',
  'recipe.classes':
    'Des classes de {size} scores sont formées depuis l’extrémité faible de l’échelle ; ce score est le numéro {number} de sa classe, et son milieu se trouve à {part} du parcours.',
  'recipe.in-classes':
    'Les classes plus faibles comptent {poorer}, cette classe {own} : ajouter cette part du second nombre au premier.',
  'recipe.ends': 'Au-dessous de {least} on imprime {low}, au-dessus de {most}, {high}.',
  'recipe.round': 'Arrondir à {unit}, {half}{held}.',
  'recipe.whole-number': 'un nombre entier',
  'recipe.one-decimal': 'une décimale',
  'recipe.half-up': 'un demi vers le haut',
  'recipe.half-even': 'un demi au chiffre pair',
  'recipe.held': ', borné entre {least} et {most}',
  'recipe.gives': '{rounding} On obtient {rank}.',
  'recipe.prints': 'Le tableau imprime {rank}.',
  'recipe.prints-smoothed':
    'Le tableau imprime {rank} : ses rangs sont lissés, et le lissage ne peut être refait à la main.',
  'recipe.prints-adjusted': 'Le tableau imprime {rank} : il a été modifié à la main, auparavant {from}.',
};
