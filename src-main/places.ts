import { homedir } from 'node:os';
import { join, resolve } from 'node:path';

type Environment = Readonly<Record<string, string | undefined>>;

/** The program's own folder on this system: drafts, recent projects, uploads while it runs. */
export function dataFolder(environment: Environment, platform: NodeJS.Platform, home = homedir()): string {
  const chosen = environment['NORMLOOM_DATA'];
  if (chosen !== undefined && chosen !== '') return resolve(chosen);
  switch (platform) {
    case 'win32':
      return join(environment['APPDATA'] ?? join(home, 'AppData', 'Roaming'), 'Normloom');
    case 'darwin':
      return join(home, 'Library', 'Application Support', 'Normloom');
    default: {
      const data = environment['XDG_DATA_HOME'];
      return join(data === undefined || !data.startsWith('/') ? join(home, '.local', 'share') : data, 'normloom');
    }
  }
}

/** Where new projects and pressed files go, unless `--folder` says otherwise. */
export function projectsFolder(environment: Environment, home = homedir()): string {
  const chosen = environment['NORMLOOM_FOLDER'];
  return chosen !== undefined && chosen !== '' ? resolve(chosen) : join(home, 'Normloom');
}
