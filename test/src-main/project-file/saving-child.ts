import { join } from 'node:path';
import { projectToText } from '../../../shared-core/norms/project-text.ts';
import { Drafts } from '../../../src-main/project-file/drafts.ts';
import { ProjectSaver } from '../../../src-main/project-file/project-saver.ts';
import { projectWithTally } from './sample-projects.ts';

/** Saves two projects in turn, without end, until it is killed. Words: data folder, projects folder. */
const [dataFolder = '', projectsFolder = ''] = process.argv.slice(2);
const saver = new ProjectSaver(dataFolder, Date.now);
const drafts = new Drafts(dataFolder);
const projects = [projectWithTally('First', 40), projectWithTally('The second one', 60)];
for (let turn = 0; ; turn += 1) {
  for (const project of projects) {
    const text = projectToText(project);
    await saver.replace(join(projectsFolder, 'saved.normloom'), text);
    await drafts.keep({ draft: 'draft-of-the-child', file: null, at: turn, project });
    if (turn % 5 === 0) await saver.createBeside(projectsFolder, 'new', '.normloom', text);
    if (turn === 0) process.stdout.write('.');
  }
}
