import type { ENGLISH_CLASS_REPORT } from '../english/class-report.ts';

/** The report of a class, in Spanish. */
export const SPANISH_CLASS_REPORT: Readonly<Record<keyof typeof ENGLISH_CLASS_REPORT, string>> = {
  'class.report': 'Informe de la clase',
  'class.tested-on': 'prueba del {date}',
  'class.table-check': 'código de control de la tabla {check}',
  'class.report-check': 'código de control del informe {check}',
  'class.continued': '{title} (continuación)',

  'class.table-lead': 'Tabla.',
  'class.table-cited': 'Publicada en: {source}.',
  'class.group-and-count': '{group} ({count})',
  'class.rank-lead': 'Rango percentil.',
  'class.rank-midpoint':
    'Cuántos de cada 100 {people} tienen, en {the-group}, una puntuación {worse}; los que tienen la misma puntuación cuentan por la mitad.',
  'class.rank-at-or-below': 'Cuántos de cada 100 {people} tienen, en {the-group}, la misma puntuación o una {worse}.',
  'class.rank-below': 'Cuántos de cada 100 {people} tienen, en {the-group}, una puntuación {worse}.',
  'class.rank-plotting-position':
    'Cuántos de cada 100 {people} tienen, en {the-group}, una puntuación {worse}; los que tienen la misma puntuación cuentan en parte.',
  'class.rank-grouped':
    'Cuántos de cada 100 {people} tienen, en {the-group}, una puntuación {worse}; los que están en el mismo intervalo de puntuaciones cuentan en parte.',
  'class.rank-unknown':
    'Cuántos de cada 100 {people} tienen, en {the-group}, una puntuación {worse}; la tabla no dice cómo se cuentan las puntuaciones iguales.',
  'class.the-norm-group': 'el grupo normativo',
  'class.the-sample': 'la muestra',
  'class.lower': 'más baja',
  'class.higher': 'más alta',
  'class.low-is-good': 'En esta prueba, una puntuación baja es buena.',
  'class.band-lead': 'Banda.',
  'class.band-text':
    'Toda puntuación tiene un error de medida. La banda lo tiene en cuenta: para unos {level} de cada 100 {people}, una banda hecha así contiene el resultado que tendrían de media en muchas pruebas de este tipo (fiabilidad {reliability}).',
  'class.band-missing':
    'No se imprime ninguna banda, porque la tabla no indica la fiabilidad. Aun así, toda puntuación tiene un error de medida: cada rango es menos seguro de lo que parece un solo número.',

  'class.column-name': 'Nombre',
  'class.column-code': 'Código',
  'class.column-group': 'Grupo',
  'class.column-table': 'Tabla',
  'class.column-status': 'Estado',
  'class.column-score': 'Puntuación\ndirecta',
  'class.column-rank': 'Rango\npercentil',
  'class.column-band': 'Banda',
  'class.nobody': 'Nadie de la lista tiene una puntuación de la que se pueda informar.',
  'class.chart-caption':
    'Figura: un punto para el rango percentil en una escala de 1 a 99. La escala sigue la curva normal (equivalentes de la curva normal), porque los rangos están muy juntos en el centro, donde unos pocos puntos los cambian mucho. Un círculo vacío indica un rango inferior a 1 o superior a 99.',
  'class.chart-caption-band':
    'Figura: un punto para el rango percentil y una barra para su banda, en una escala de 1 a 99. La escala sigue la curva normal (equivalentes de la curva normal), porque los rangos están muy juntos en el centro, donde unos pocos puntos los cambian mucho. Un círculo vacío indica un rango inferior a 1 o superior a 99; una barra sin trazo en su extremo sale de la escala.',
  'class.chart-alt': 'Rangos percentiles en una misma escala de 1 a 99.',
  'class.chart-alt-band': 'Rangos percentiles y bandas en una misma escala de 1 a 99.',
  'class.chart-alt-row': '{name}: {rank}.',
  'class.chart-alt-row-band': '{name}: {rank}, banda {band}.',
  'class.absent': 'Faltaron ({count}):',
  'class.not-tested': 'Sin prueba ({count}):',
  'class.excused': 'Con dispensa ({count}):',
  'class.left-out': 'Excluidos ({count}):',
  'class.open': 'Por responder ({count}):',
  'class.corrected': 'Puntuación introducida de nuevo ({count}):',
  'class.name-and-why': '{name} ({why})',
  'class.left-out-code': 'fuera por una respuesta sobre la lista',
  'class.open-code': 'hay una pregunta sobre la lista sin responder',

  'class.sheet-class': 'Clase',
  'class.sheet-groups': 'Grupos',
  'class.sheet-summary': 'Resumen',
  'class.sheet-about': 'Acerca de',

  'class.count-listed': 'En la lista',
  'class.count-reported': 'Con resultado',
  'class.count-absent': 'Faltaron',
  'class.count-not-tested': 'Sin prueba',
  'class.count-excused': 'Con dispensa',
  'class.count-left-out': 'Excluidos',
  'class.count-open': 'Por responder',
  'class.counts-heading': 'Quién está en este informe',
  'class.counted': 'Quién',
  'class.count': 'Número',
  'class.scores-heading': 'Puntuaciones directas de la clase',
  'class.place': 'Lugar en la clase',
  'class.score': 'Puntuación directa',
  'class.lowest': 'Más baja',
  'class.lower-hinge': 'Bisagra inferior',
  'class.median': 'Mediana',
  'class.upper-hinge': 'Bisagra superior',
  'class.highest': 'Más alta',
  'class.box-caption':
    'La caja va de bisagra a bisagra y abarca así la mitad central de la clase; el trazo interior es la mediana, y las líneas terminan en la puntuación más baja y en la más alta. Cada punto es un resultado de la clase.',
  'class.box-alt': 'Diagrama de caja de las puntuaciones directas: {numbers}.',
  'class.scores-listed': 'Un diagrama de caja necesita cinco puntuaciones o más. Las puntuaciones son: {scores}.',
  'class.quarters-heading': 'Dónde está la clase en el grupo normativo',
  'class.quarters-heading-sample': 'Dónde está la clase en la muestra',
  'class.quarter-ranks': 'Rangos percentiles',
  'class.quarter-count': 'En la clase',
  'class.quarters-expected':
    'El trazo gris es un cuarto de {n}, es decir, {expected}. En {the-group}, aproximadamente un cuarto tiene rangos en cada uno de estos tramos. Una clase es pequeña y no se ha sorteado, de modo que unos pocos más o menos no dicen nada por sí solos.',
  'class.quarters-alt': '{counts}. Un cuarto de {n} es {expected}.',
  'class.quarter-alt': 'rangos {ranks}: {count}',
  'class.compared-heading': 'Grupos en la clase',
  'class.compared-group': 'Grupo',
  'class.compared-n': 'n',
  'class.compared-median': 'Mediana de las\npuntuaciones',
  'class.compared-mean': 'Media de las\npuntuaciones',
  'class.compared-nce': 'Media de\nlos ECN',
  'class.compared-note':
    'Los grupos se comparan por puntuaciones directas y por equivalentes de la curva normal (ECN), cuyos pasos son iguales. Un guion: no se da la media de menos de dos, ni la de los ECN si falta alguno. Las diferencias entre grupos tan pequeños pueden deberse al azar.',
  'class.no-mean-lead': 'Sin rango medio.',
  'class.no-mean':
    'Los rangos percentiles no se promedian: sus pasos son desiguales y su media no es el rango de nada. Tampoco se busca en la tabla la puntuación media de la clase, porque la tabla sitúa a {people} por separado, no a clases enteras.',
  'class.read-lead': 'Cómo se lee.',
  'class.read':
    'La puntuación directa es lo que se contó en la prueba; el rango percentil es su lugar en {the-group}. Compare las bandas más que los rangos: donde dos bandas se solapan, la prueba no distingue con certeza entre esos {people}.',
  'class.read-no-band':
    'La puntuación directa es lo que se contó en la prueba; el rango percentil es su lugar en {the-group}. Las diferencias pequeñas entre rangos, sobre todo en el centro de la escala, están dentro del error de la prueba.',
  'class.cautions-lead': 'Atención.',
  'class.cautions':
    'Un rango percentil no es un porcentaje de respuestas correctas ni una nota. Vale para esta forma de la prueba, esta época y este grupo. Ninguna decisión sobre nadie puede basarse en una sola puntuación; siga las normas locales y el criterio de profesionales cualificados.',
  'class.private-lead': 'Quién puede verlo.',
  'class.private-names':
    'Este informe contiene nombres. Guárdelo como un registro de notas y entréguelo solo a quienes puedan verlo.',
  'class.private-codes':
    'Los códigos sustituyen a los nombres, en un orden sorteado. Guarde la clave separada de este informe; con ella, o con lo que alguien ya sepa, se puede saber de quién es cada resultado.',

  'class.summary-lead': 'Resumen.',
  'class.summary-all': 'Este resumen no nombra a nadie, y todos sus recuentos se muestran.',
  'class.summary-hidden':
    'Este resumen no nombra a nadie. Los recuentos menores que {least} están ocultos, y también todo recuento del que pudiera deducirse uno; «oculto» puede ser cualquier número.',
  'class.summary-class-only':
    'No se dan recuentos por grupos, porque no todos los grupos son bastante grandes para ocultar en ellos los recuentos menores que {least}.',
  'class.summary-nothing':
    'Este resumen no nombra a nadie ni da recuentos: lo que se ocultara para no mostrar recuentos menores que {least} podría deducirse del resto.',
  'class.summary-again':
    'Compártalo una sola vez: si se hace de nuevo después de que alguien haya llegado, se haya ido o haya hecho la prueba más tarde, la diferencia puede revelar algo de esa persona.',
  'class.summary-ends': 'No se dicen la puntuación más baja ni la más alta, porque cada una es de alguien.',
  'class.summary-not-tested': 'Sin\nprueba',
  'class.hidden': 'oculto',
  'class.summary-heading': 'La clase por rangos percentiles',
  'class.summary-ranks': 'Rangos\n{ranks}',
  'class.summary-tested': 'Con\nresultado',
  'class.summary-total': 'En la\nlista',
  'class.summary-whole': 'Toda la clase',
  'class.summary-no-group': 'Sin grupo',
};
