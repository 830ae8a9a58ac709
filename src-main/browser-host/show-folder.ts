import { spawn } from 'node:child_process';

const FILE_MANAGERS: Readonly<Partial<Record<NodeJS.Platform, string>>> = {
  win32: 'explorer.exe',
  darwin: 'open',
  linux: 'xdg-open',
};

/** Shows a folder in the system's file manager. Rejects with a sentence where that cannot be started. */
export function showFolder(folder: string): Promise<void> {
  const command = FILE_MANAGERS[process.platform];
  return new Promise((resolve, reject) => {
    const failed = (): void => {
      reject(new Error(`the file manager could not be started; open the folder ${folder}`));
    };
    if (command === undefined) {
      failed();
      return;
    }
    const child = spawn(command, [folder], { stdio: 'ignore', detached: true });
    child.once('error', failed);
    child.once('spawn', () => {
      child.unref();
      resolve();
    });
  });
}
