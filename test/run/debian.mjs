import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';

/** Full path of the first of these programs that is on PATH; null when none is. @param {...string} names */
export const onPath = (...names) => {
  const folders = (process.env.PATH ?? '').split(delimiter).filter((folder) => folder !== '');
  const endings = process.platform === 'win32' ? ['.exe', '.cmd', ''] : [''];
  for (const name of names) {
    for (const folder of folders) {
      const found = endings.map((ending) => join(folder, name + ending)).find((file) => existsSync(file));
      if (found !== undefined) return found;
    }
  }
  return null;
};

const isRootOnDebian = () =>
  process.getuid?.() === 0 && existsSync('/etc/debian_version') && onPath('apt-get') !== null;

/** @param {string[]} words */
const aptGet = (words) =>
  spawnSync('apt-get', ['-o', 'DPkg::Lock::Timeout=300', '-qq', '-y', ...words], {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    stdio: ['ignore', 'ignore', 'inherit'],
  }).status === 0;

/**
 * Installs Debian packages, where this is Debian and the user is root; says so in one line. False when it cannot.
 * @param {string[]} packages
 * @param {(line: string) => void} say
 */
export const installOnDebian = (packages, say) => {
  if (!isRootOnDebian()) return false;
  say(`Installing ${packages.join(', ')} with apt-get (once)…`);
  const words = ['install', '--no-install-recommends', ...packages];
  return aptGet(words) || (aptGet(['update']) && aptGet(words));
};

const TOOLS = [
  { program: ['pdftotext'], package: 'poppler-utils', why: 'reads the pages of pressed PDFs back' },
  { program: ['qpdf'], package: 'qpdf', why: 'checks pressed PDFs' },
  { program: ['soffice', 'libreoffice'], package: 'libreoffice-calc-nogui', why: 'computes pressed workbooks' },
  { program: ['7z', '7zz'], package: 'p7zip-full', why: 'packs archives' },
];

/** Sees to the programs that some tests read results with. @param {(line: string) => void} say */
export const ensureTools = (say) => {
  const missing = TOOLS.filter((tool) => onPath(...tool.program) === null);
  if (missing.length === 0) return;
  if (
    installOnDebian(
      missing.map((tool) => tool.package),
      say,
    )
  )
    return;
  for (const tool of missing) say(`Not installed: ${tool.program[0]} (${tool.why}); tests that need it will fail.`);
};
