// Writes ostrey-vale.normloom: the ready project of the invented Ostrey Vale reading survey, with the tally of
// ostrey-vale-reading.csv. Run `node make-ostrey-vale-project.mjs` to write the file again, or add --print to see it on
// stdout instead. It reads the cohort with the program's own sources, so that the same bytes come out on every machine.
import { writeFileSync } from 'node:fs';
import process from 'node:process';
import { fileURLToPath } from 'node:url';
import { runnerImport } from 'vite';

const COHORT = 'ostrey-vale-reading.csv';
const PROJECT = 'ostrey-vale.normloom';

const here = (name) => fileURLToPath(new URL(name, import.meta.url));

/** A module of the program, from its source. */
async function source(path) {
  const { module } = await runnerImport(here(`../../${path}`), { configFile: false, root: here('../..') });
  return module;
}

const READING = {
  layout: 'people',
  encoding: 'utf-8',
  separator: ',',
  decimalMark: '.',
  header: true,
  sheet: null,
  roles: [
    { column: 'pupil_id', role: 'id' },
    { column: 'school', role: 'cluster' },
    { column: 'grade', role: 'group' },
    { column: 'form', role: 'group' },
    { column: 'age_months', role: 'unused' },
    { column: 'raw_score', role: 'score' },
    { column: 'weight', role: 'weight' },
  ],
  missing: ['99', 'abs'],
  scale: { min: 0, max: 40, step: 1, direction: 'high-is-good' },
  decisions: { duplicateId: 'keep-first', raggedRow: 'leave-out', blankGroup: 'leave-out', blankCluster: 'alone' },
};

const DOCUMENTATION = {
  population: 'All pupils of grades 4 to 6 in the 24 schools of Ostrey Vale, a district that is invented, as are they.',
  sampling: 'Nobody was chosen: every pupil on the rolls was asked (invented).',
  participation: 'Of 5,063 pupils on the rolls 4,812 gave a score that can be used, 95 in 100 (invented).',
  testDates: '11 to 22 May 2026 (invented)',
  weighting: 'Each pupil carries a weight that brings the school to its share of the rolls (invented).',
};

const NOTES =
  'Everything here is invented: no pupil, school or district stands behind these numbers. Forms A and B were handed out ' +
  'in turn within each school and are tabled together; form B is about half a mark harder than form A. The reliability ' +
  'of 0.89 and the spring goal of 20 are invented too.';

async function projectText() {
  const { newProject } = await source('shared-core/norms/new-project.ts');
  const { projectFromText, projectToText } = await source('shared-core/norms/project-text.ts');
  const { tallyCohort } = await source('src-main/cohort-file/tally-cohort.ts');
  const hooks = { onProgress: () => undefined, signal: new AbortController().signal };
  const tallied = await tallyCohort(here(COHORT), COHORT, READING, hooks);
  if (!tallied.ok) throw new Error(tallied.problem);
  const bare = newProject('Ostrey Vale reading survey (invented)');
  const text = projectToText({
    ...bare,
    subtitle: 'Forms A and B · spring 2026',
    people: 'pupils',
    source: tallied.value.source,
    reading: READING,
    tally: tallied.value.tally,
    groups: { by: ['grade'], choices: [], documentation: DOCUMENTATION },
    precision: { ...bare.precision, reliability: 0.89 },
    table: { ...bare.table, columns: ['stanine', 't'] },
    sheet: { ...bare.sheet, cautions: bare.sheet.cautions.replace('this form,', 'these forms, this'), notes: NOTES },
    release: { ...bare.release, edition: '1.0', date: '2026-06-15' },
    cuts: [{ name: 'Spring goal (invented)', score: 20, values: null }],
    classTable: ['5'],
  });
  const read = projectFromText(text);
  if (!read.ok) throw new Error(read.problem);
  return projectToText(read.project);
}

const text = await projectText();
if (process.argv.includes('--print')) process.stdout.write(text);
else writeFileSync(here(PROJECT), text);
