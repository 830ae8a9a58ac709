import { join, resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { findBrowser, hasDisplay } from '../../../src-main/browser-host/app-window.ts';
import { dataFolder, projectsFolder } from '../../../src-main/places.ts';
import { readStartWords } from '../../../src-main/browser-host/start-words.ts';

describe('words the browser host is started with', () => {
  it('name a file, a port, a folder, and whether to open a window', () => {
    expect(readStartWords([], '/surveys')).toEqual({
      ok: true,
      words: { file: null, window: true, port: 0, folder: null },
    });
    expect(readStartWords(['a.csv', '--no-window', '--port', '4100', '--folder', 'out'], '/surveys')).toEqual({
      ok: true,
      words: { file: resolve('/surveys/a.csv'), window: false, port: 4100, folder: resolve('/surveys/out') },
    });
  });

  it.each([[['--port', '70000']], [['--port', 'x']], [['--windows']], [['a', 'b']], [['--folder']]])(
    'are refused with a sentence: %j',
    (words) => {
      const read = readStartWords(words, '/surveys');
      expect(read.ok).toBe(false);
    },
  );
});

describe('places on each system', () => {
  it('follow the custom of the system, or what the environment says', () => {
    expect(dataFolder({}, 'linux', '/home/a')).toBe(join('/home/a', '.local', 'share', 'normloom'));
    expect(dataFolder({ XDG_DATA_HOME: '/data' }, 'linux', '/home/a')).toBe(join('/data', 'normloom'));
    expect(dataFolder({ XDG_DATA_HOME: 'relative' }, 'linux', '/home/a')).toBe(
      join('/home/a', '.local', 'share', 'normloom'),
    );
    expect(dataFolder({ APPDATA: '/roaming' }, 'win32', '/home/a')).toBe(join('/roaming', 'Normloom'));
    expect(dataFolder({}, 'darwin', '/Users/a')).toBe(join('/Users/a', 'Library', 'Application Support', 'Normloom'));
    expect(dataFolder({ NORMLOOM_DATA: '/own' }, 'darwin', '/Users/a')).toBe(resolve('/own'));
    expect(projectsFolder({}, '/home/a')).toBe(join('/home/a', 'Normloom'));
    expect(projectsFolder({ NORMLOOM_FOLDER: '/own' }, '/home/a')).toBe(resolve('/own'));
  });
});

describe('the browser for the window', () => {
  it('is the one named, else one that is installed, else none', () => {
    const there =
      (...paths: string[]) =>
      (path: string) =>
        paths.includes(path);
    const linux = { PATH: '/usr/local/bin:/usr/bin' };
    expect(findBrowser(linux, 'linux', there('/usr/bin/google-chrome', '/usr/bin/chromium'))).toBe('/usr/bin/chromium');
    expect(findBrowser({ ...linux, BROWSER_PATH: '/opt/b' }, 'linux', there('/opt/b', '/usr/bin/chromium'))).toBe(
      '/opt/b',
    );
    expect(findBrowser({ ...linux, BROWSER_PATH: '/opt/b' }, 'linux', there('/usr/bin/chromium'))).toBe(
      '/usr/bin/chromium',
    );
    expect(findBrowser(linux, 'linux', there())).toBeNull();
    const chrome = '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome';
    expect(findBrowser({}, 'darwin', there(chrome))).toBe(chrome);
  });

  it('needs a display', () => {
    expect(hasDisplay({}, 'linux')).toBe(false);
    expect(hasDisplay({ DISPLAY: '' }, 'linux')).toBe(false);
    expect(hasDisplay({ WAYLAND_DISPLAY: 'wayland-0' }, 'linux')).toBe(true);
    expect(hasDisplay({}, 'win32')).toBe(true);
  });
});
