import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { newClass } from '../../../shared-core/class/new-class.ts';
import { DESK_REQUESTS } from '../../../shared-core/desk.ts';
import { newProject } from '../../../shared-core/norms/new-project.ts';
import { deskAtHand, READING, type DeskAtHand } from './desk-at-hand.ts';

const project = newProject('Ostrey Vale');
const file = newClass('Class 5a', 1);
const draft = 'a-draft-name';

/** For every request: things it must not be asked with. */
const WRONG: Readonly<Record<(typeof DESK_REQUESTS)[number], readonly unknown[]>> = {
  about: ['x'],
  'list-projects': [7],
  'choose-file': [{}, { kind: 'folder' }],
  'open-project': [{}, { handle: 3 }, { handle: 'x'.repeat(65) }, { handle: null }],
  'look-at-edition': [{}, { handle: 3 }],
  'open-draft': [{}, { draft: '../../secret' }, { draft: 'short' }, { draft: 'CAPITALS-HERE' }],
  'open-sample': [false],
  'forget-draft': [{}, { draft: '..' }, { draft: 'a/../../b-c-d-e' }],
  'keep-draft': [
    { draft, project },
    { draft, handle: null },
    { draft, handle: null, project: { ...project, version: 99 } },
  ],
  'save-project': [
    { draft, handle: null, project },
    { draft, handle: null, name: 'x'.repeat(401), project },
    { draft, handle: null, name: 'x', project: { ...project, people: 'sheep' } },
    { draft: '../draft', handle: null, name: 'x', project },
  ],
  'look-at-cohort': [{ handle: 'x' }, { handle: 'x', reading: { ...READING, separator: 'x' } }],
  'tally-cohort': [
    { handle: 'x', reading: null },
    { handle: 'x', reading: { ...READING, scale: { min: 0, max: 0 } } },
  ],
  'draw-pages': [{}, { project: { ...project, title: 7 } }],
  press: [{ project }, { project: { ...project, sheet: null }, name: 'x' }],
  release: [{ project }, { project: { ...project, release: null }, name: 'x' }],
  'make-erratum': [
    { before: project, after: project, roster: null, cut: '' },
    { before: project, after: { ...project, title: 7 }, roster: null, cut: '', write: true },
    { before: project, after: project, roster: { handle: 'x' }, cut: '', write: true },
  ],
  'list-classes': [false],
  'open-class': [{}, { handle: 3 }],
  'save-class': [
    { handle: null, name: 'x' },
    { handle: null, class: file },
    { handle: null, name: 'x', class: { ...file, format: 'normloom-project' } },
    { handle: null, name: 'x', class: { ...file, sharing: { as: 'everybody', seed: 1 } } },
  ],
  'class-table': [{}, { handle: 3 }],
  'look-at-list': [{ handle: 'x' }, { handle: 'x', sheet: 1 }, { handle: null, sheet: null }],
  'draw-class': [{ class: file }, { class: file, what: 'key' }, { class: null, what: 'report' }],
  'press-class': [
    { class: file, slips: true },
    { class: { ...file, list: [] }, slips: true, name: 'x' },
  ],
  'job-state': [{}, { job: {} }],
  'cancel-job': [{}, { job: 'x'.repeat(65) }],
  'show-pressed': ['x'],
};

describe('what a desk is asked is checked when it is asked', () => {
  let hand: DeskAtHand;
  beforeAll(async () => {
    hand = await deskAtHand();
  });
  afterAll(() => hand.close());

  it.each(DESK_REQUESTS)('%s refuses wrong arguments with a sentence', async (request) => {
    for (const wrong of [null, undefined, ...WRONG[request]]) {
      expect(await hand.problem(request, wrong), JSON.stringify(wrong)).toMatch(/^The request ".*" was not understood/);
    }
  });

  it('refuses requests it does not know, names of object members too', async () => {
    for (const request of ['', 'read-file', 'constructor', '__proto__', 'toString']) {
      expect(await hand.problem(request, {})).toBe('Normloom does not know this request.');
    }
  });

  it('refuses handles, drafts and jobs that it did not give out', async () => {
    const handle = 'AAAAAAAAAAAAAAAAAAAAAA';
    const unknown = /no longer knows this file/;
    expect(await hand.problem('open-project', { handle })).toMatch(unknown);
    expect(await hand.problem('look-at-edition', { handle })).toMatch(unknown);
    expect(await hand.problem('look-at-cohort', { handle, reading: null })).toMatch(unknown);
    expect(await hand.problem('tally-cohort', { handle, reading: READING })).toMatch(unknown);
    expect(await hand.problem('keep-draft', { draft, handle, project })).toMatch(unknown);
    expect(await hand.problem('save-project', { draft, handle, name: 'x', project })).toMatch(unknown);
    expect(await hand.problem('open-class', { handle })).toMatch(unknown);
    expect(await hand.problem('save-class', { handle, name: 'x', class: file })).toMatch(unknown);
    expect(await hand.problem('class-table', { handle })).toMatch(unknown);
    expect(await hand.problem('look-at-list', { handle, sheet: null })).toMatch(unknown);
    const roster = { handle, reading: READING, columns: { score: 'score', person: null, by: [] } };
    const erratum = { before: project, after: project, roster, cut: '', write: false };
    expect(await hand.problem('make-erratum', erratum)).toMatch(unknown);
    expect(await hand.problem('open-draft', { draft })).toMatch(/no longer there/);
    expect(await hand.problem('job-state', { job: 'x' })).toMatch(/Start it again/);
    expect(await hand.problem('show-pressed', {})).toMatch(/Nothing was pressed/);
    expect(await hand.problem('choose-file', { kind: 'cohort' })).toMatch(/Drop the file/);
    expect(await hand.problem('open-sample', {})).toMatch(/ostrey-vale\.normloom could not be read/);
    expect(await hand.ask('forget-draft', { draft })).toBeNull();
    expect(await hand.ask('cancel-job', { job: 'x' })).toBeNull();
  });

  it('refuses a project larger than any file may be', async () => {
    const many = Array.from({ length: 9000 }, () => ({ query: 'q', reason: 'r'.repeat(8000) }));
    const large = { ...project, release: { ...project.release, answers: many } };
    expect(await hand.problem('save-project', { draft, handle: null, name: 'x', project: large })).toMatch(
      /more than 64 MB/,
    );
    expect(await hand.problem('keep-draft', { draft, handle: null, project: large })).toMatch(/more than 64 MB/);
  });
});
