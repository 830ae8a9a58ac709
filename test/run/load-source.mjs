/**
 * Modules of the program for scripts that run outside its build: bundles a TypeScript file of this repository for Node
 * into .cache/scripts and imports it.
 */
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'vite';

const ROOT = fileURLToPath(new URL('../..', import.meta.url));

/** The exports of a source file, named from the root of the repository. */
export async function loadSource(path) {
  const name = path.replace(/\.ts$/, '').replaceAll('/', '-');
  await build({
    root: ROOT,
    configFile: false,
    logLevel: 'warn',
    publicDir: false,
    build: {
      ssr: path,
      outDir: '.cache/scripts',
      emptyOutDir: false,
      minify: false,
      target: 'node20',
      rolldownOptions: { output: { entryFileNames: `${name}.mjs` } },
    },
  });
  return import(pathToFileURL(`${ROOT}/.cache/scripts/${name}.mjs`).href);
}
