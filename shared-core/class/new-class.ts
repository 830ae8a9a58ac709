import { ENGLISH_LANGUAGE } from '../norms/sheet-schema.ts';
import { CLASS_FORMAT, CLASS_VERSION, type ClassFile } from './class-file.ts';

/**
 * A class with no list yet and every choice at its default. The seed decides the order and the codes under which pupils
 * are shown: a caller draws a new one for every class and never prints it, since the order can be had again from it.
 */
export function newClass(title: string, seed: number): ClassFile {
  return {
    format: CLASS_FORMAT,
    version: CLASS_VERSION,
    title,
    date: '',
    people: 'pupils',
    table: null,
    group: null,
    direction: 'high-is-good',
    list: { decimalMark: '.', rows: [] },
    answers: [],
    report: { paper: 'a4', sort: 'list', columns: [], language: ENGLISH_LANGUAGE },
    slips: { paper: 'a4', perPage: 4, language: ENGLISH_LANGUAGE, texts: [] },
    sharing: { as: 'names', seed },
  };
}
