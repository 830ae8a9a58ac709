import type { ENGLISH_RECIPE } from '../english/recipe.ts';

export const SPANISH_RECIPE: Readonly<Record<keyof typeof ENGLISH_RECIPE, string>> = {
  'recipe.take': 'Se parte de {people} ({group}) y de la puntuación directa {score}.',
  'recipe.take-weighted':
    'Se parte de {people} ({group}), cuyos pesos suman {weight}, y de la puntuación directa {score}.',
  'recipe.count-lower':
    'Contar a quienes tienen una puntuación inferior: {worse}. Contar a quienes tienen esta: {same}.',
  'recipe.count-higher':
    'Contar a quienes tienen una puntuación superior: {worse}. Contar a quienes tienen esta: {same}.',
  'recipe.weigh-lower':
    'Sumar los pesos de quienes tienen una puntuación inferior: {worse}; y de quienes tienen esta: {same}.',
  'recipe.weigh-higher':
    'Sumar los pesos de quienes tienen una puntuación superior: {worse}; y de quienes tienen esta: {same}.',
  'recipe.add-half': 'Sumar la mitad del segundo número al primero: {sum}.',
  'recipe.add-both': 'Sumar ambos números: {sum}.',
  'recipe.keep-first': 'Quedarse solo con el primer número: {sum}.',
  'recipe.divide': 'Dividir por {all} y multiplicar por 100: {rank}.',
  'recipe.mean-rank': 'Sumar la mitad del segundo número al primero y añadir 1/2: el rango medio r es {mean}.',
  'recipe.mean-rank-scaled':
    'Sumar la mitad del segundo número al primero, multiplicar por {factor} y añadir 1/2: el rango medio r es {mean}.',
  'recipe.plotting-position': 'Con a = {offset}, 100 (r − a)/({count} + 1 − 2a) es {rank} (limitado entre 0 y 100).',
  'recipe.classes':
    'Desde el extremo peor de la escala se forman clases de {size} puntuaciones; esta puntuación es la número {number} de su clase, y su centro está a {part} del recorrido.',
  'recipe.in-classes':
    'En clases peores hay {poorer}; en esta clase, {own}: sumar esa parte del segundo número al primero.',
  'recipe.ends': 'Por debajo de {least} se imprime {low}; por encima de {most}, {high}.',
  'recipe.round': 'Redondear a {unit}, {half}{held}.',
  'recipe.whole-number': 'un número entero',
  'recipe.one-decimal': 'un decimal',
  'recipe.half-up': 'una mitad hacia arriba',
  'recipe.half-even': 'una mitad a la cifra par',
  'recipe.held': ', limitado entre {least} y {most}',
  'recipe.gives': '{rounding} Resulta {rank}.',
  'recipe.prints': 'La tabla imprime {rank}.',
  'recipe.prints-smoothed':
    'La tabla imprime {rank}: sus rangos están suavizados, y el suavizado no puede rehacerse a mano.',
  'recipe.prints-adjusted': 'La tabla imprime {rank}: se cambió a mano, antes {from}.',
};
