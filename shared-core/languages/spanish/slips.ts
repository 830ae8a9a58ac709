import type { ENGLISH_SLIPS } from '../english/slips.ts';

/** The slip that goes home with a pupil, in Spanish. */
export const SPANISH_SLIPS: Readonly<Record<keyof typeof ENGLISH_SLIPS, string>> = {
  'slip.title': '{class} · Hojas de resultados',
  'slip.test': '{test}, prueba del {date}',
  'slip.score-label': 'Puntuación',
  'slip.rank-label': 'Rango percentil',
  'slip.band-label': 'Banda',

  'slip.means': 'Qué significa este resultado',
  'slip.score': '{name} obtuvo una puntuación de {score} en una escala de {lowest} a\u00a0{highest}.',
  'slip.low-is-good': 'En esta prueba, una puntuación baja es buena.',
  'slip.group': 'Se compara con las puntuaciones de otros {people}: {group}.',
  'slip.population': 'Representan a: {population}.',
  'slip.rank-midpoint':
    'De cada 100 de ellos, hay {share} con una puntuación {worse}: ese es el rango percentil. (Los que tienen exactamente la misma puntuación cuentan por la mitad.)',
  'slip.rank-at-or-below':
    'De cada 100 de ellos, hay {share} con la misma puntuación o una {worse}: ese es el rango percentil.',
  'slip.rank-below': 'De cada 100 de ellos, hay {share} con una puntuación {worse}: ese es el rango percentil.',
  'slip.rank-plotting-position':
    'De cada 100 de ellos, hay {share} con una puntuación {worse}: ese es el rango percentil. (Los que tienen exactamente la misma puntuación cuentan en parte.)',
  'slip.rank-grouped':
    'De cada 100 de ellos, hay {share} con una puntuación {worse}: ese es el rango percentil. (Los que tienen la misma puntuación, o una cercana, cuentan en parte.)',
  'slip.rank-unknown':
    'De cada 100 de ellos, hay {share} con una puntuación {worse}: ese es el rango percentil. (No se sabe cómo se cuentan los que tienen exactamente la misma puntuación.)',
  'slip.share-about': 'alrededor de {rank}',
  'slip.share-below': 'menos de {rank}',
  'slip.share-above': 'más de {rank}',
  'slip.adjusted': 'Quienes hicieron la tabla fijaron a mano este rango percentil.',
  'slip.band':
    'Ninguna prueba es exacta. Otro día, o con otras preguntas del mismo tipo, {name} podría haber obtenido algo más o algo menos. La banda, {band}, lo tiene en cuenta: para unos {level} de cada 100 {people}, una banda así contiene el resultado que tendrían de media si hicieran muchas pruebas de este tipo.',
  'slip.no-band':
    'Ninguna prueba es exacta. Otro día, o con otras preguntas del mismo tipo, {name} podría haber obtenido algo más o algo menos. Cuánto, no se sabe en esta prueba.',
  'slip.picture-dot': 'El punto es el rango percentil.',
  'slip.picture-ring': 'El círculo vacío indica un rango percentil más allá del extremo de la escala.',
  'slip.picture-bar': 'La barra es la banda.',
  'slip.picture-scale':
    '50 es el centro; allí los rangos están más juntos, porque allí está la mayoría de las puntuaciones.',
  'slip.picture-alt': 'Una escala de rangos percentiles de 1 a 99. El rango percentil es {rank}.',
  'slip.picture-alt-band':
    'Una escala de rangos percentiles de 1 a 99. El rango percentil es {rank} y la banda, {band}.',

  'slip.means-not': 'Qué no significa',
  'slip.not-per-cent':
    'No es el porcentaje de respuestas correctas. No es una nota, y 50 no es el límite para aprobar.',
  'slip.not-judgement': 'Muestra cómo fue una prueba un día. No juzga a {name} ni dice lo que {name} puede aprender.',
  'slip.not-alone':
    'También cuenta lo que saben los profesores y la familia. No debería decidirse nada solo por este resultado.',
  'slip.ask': 'Pregunte en el centro si algo no está claro, cómo se usa este resultado y qué normas lo regulan.',
};
