import type { ENGLISH_FIT } from '../english/fit.ts';

export const SPANISH_FIT: Readonly<Record<keyof typeof ENGLISH_FIT, string>> = {
  'fit.title': 'Notas técnicas sobre el suavizado',
  'fit.degrees-lead': 'Grados.',
  'fit.fit-lead': 'Ajuste.',
  'fit.beware-lead': 'Cuidado.',
  'fit.degree': 'Grado',
  'fit.df': 'gl',
  'fit.about-degrees':
    'G² y X² indican lo lejos que están las frecuencias ajustadas de las observadas. AIC y BIC añaden un recargo por ' +
    'cada parámetro; menos es mejor. p contrasta un grado con el inmediatamente inferior. El grado elegido va en ' +
    'negrita, sobre una línea.',
  'fit.none-found': 'Donde hay guiones no se halló ajuste.',
  'fit.nearly-as-good': 'Igual de buenos según BIC, más bajo o como mucho 2 más alto: grado {degrees}.',
  'fit.moment': 'Momento',
  'fit.observed': 'Observado',
  'fit.smoothed': 'Suavizado',
  'fit.mean': 'Media',
  'fit.sd': 'Desviación típica, dividiendo por n',
  'fit.skewness': 'Asimetría',
  'fit.excess-kurtosis': 'Exceso de curtosis',
  'fit.moment-pair': '{moment}: {observed} observado, {smoothed} suavizado',
  'fit.misfit': 'G² es {g2} y X² {x2}, con {df} grados de libertad.',
  'fit.bandwidth': 'El ancho de banda del núcleo es de {bandwidth} puntos directos.',
  'fit.bandwidth-found':
    'El ancho de banda del núcleo es de {bandwidth} puntos directos, hallado a partir de los datos.',
  'fit.largest-move':
    'El mayor desplazamiento de un rango es de {points} puntos de rango percentil, en la puntuación {score}.',
  'fit.changed': 'El suavizado cambia {changed} de {of} rangos impresos.',
  'fit.filled-gaps': 'La curva espera cinco o más {people} en {scores}, donde no hay nadie.',
  'fit.invented-dips': 'La curva tiene un valle en {scores}; los datos no.',
};
