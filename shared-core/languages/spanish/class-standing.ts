import type { ENGLISH_CLASS_STANDING } from '../english/class-standing.ts';

/** The report of a class without a table, in Spanish. */
export const SPANISH_CLASS_STANDING: Readonly<Record<keyof typeof ENGLISH_CLASS_STANDING, string>> = {
  'standing.title': 'Orden dentro de la clase',
  'standing.lead': 'Orden dentro de la clase.',
  'standing.text':
    'No hay tabla para esta prueba. Las puntuaciones se ordenan dentro de esta clase de {n} y no dicen nada más allá de ella. El puesto 1 es la mejor puntuación; las puntuaciones iguales comparten sus puestos.',
  'standing.coarse-lead': 'Qué precisión tiene.',
  'standing.coarse':
    '{one} de {n} equivale a {points} puntos de la última columna. Un poco más o menos de puntuación puede cambiar varios puestos.',
  'standing.place': 'Puesto',
  'standing.share-low': 'Igual o\nmás baja, %',
  'standing.share-high': 'Igual o\nmás alta, %',
  'standing.cautions':
    'Un puesto depende de quién está en la clase. No dice cuánto se ha aprendido, no es una nota y no dice nada de otras clases. Ninguna decisión sobre nadie puede basarse en una sola puntuación; siga las normas locales y el criterio de profesionales cualificados.',
};
