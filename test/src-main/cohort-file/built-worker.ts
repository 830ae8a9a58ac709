import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'vite';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

export interface BuiltWorker {
  readonly worker: URL;
  /** A program that reads a file in the worker until it is killed. */
  readonly reader: string;
}

/** Builds the tally worker, and a program that starts it, below the repository, where they find their packages. */
export async function buildWorker(): Promise<BuiltWorker> {
  const outDir = here('../../../.cache/tally-worker');
  await build({
    configFile: false,
    logLevel: 'error',
    root: here('../../..'),
    build: {
      ssr: true,
      outDir,
      emptyOutDir: true,
      target: 'node20',
      rolldownOptions: {
        input: {
          'tally-worker': here('../../../src-main/cohort-file/tally-worker.ts'),
          'reading-child': here('./reading-child.ts'),
        },
        output: { entryFileNames: '[name].js' },
      },
    },
  });
  return { worker: pathToFileURL(`${outDir}/tally-worker.js`), reader: `${outDir}/reading-child.js` };
}
