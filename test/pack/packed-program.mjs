// Packs the program with a stand-in for Electron, takes the packed files out to an empty folder, and runs them there
// under plain Node: the browser host, asked for its page and what it is, and the command line, pressing the sample.
import assert from 'node:assert/strict';
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { inRoot } from '../../src-main/launch/folders.mjs';

const PATIENCE_MS = 30_000;

const output = inRoot('.cache', 'packed');
// Outside the repository, so that nothing is found in its node_modules that is missing from the package.
const outside = mkdtempSync(join(tmpdir(), 'normloom-packed-'));
const program = join(outside, 'program');
const environment = {
  ...process.env,
  NORMLOOM_DATA: join(outside, 'data'),
  NORMLOOM_FOLDER: join(outside, 'projects'),
};

/** @param {string[]} words @param {string} [cwd] */
const run = (words, cwd = inRoot()) => {
  const done = spawnSync(process.execPath, words, { cwd, env: environment, encoding: 'utf8' });
  assert.equal(done.status, 0, `${words.join(' ')} ended with ${done.status}:\n${done.stdout}${done.stderr}`);
  return done.stdout;
};

const pack = () => {
  rmSync(output, { recursive: true, force: true });
  run([inRoot('src-main', 'launch', 'pack.mjs'), '--dir', '--stub', '--output', output]);
  const archive = packedArchive();
  run([inRoot('node_modules', '@electron', 'asar', 'bin', 'asar.js'), 'extract', archive, program]);
  const megabytes = statSync(archive).size / 1e6;
  assert.ok(megabytes < 60, `The archive has ${megabytes.toFixed(0)} MB; look at the files of electron-builder.yml.`);
};

const packedArchive = () => {
  const places = [
    join(output, 'linux-unpacked', 'resources', 'app.asar'),
    join(output, 'win-unpacked', 'resources', 'app.asar'),
    join(output, 'mac', 'Normloom.app', 'Contents', 'Resources', 'app.asar'),
    join(output, 'mac-arm64', 'Normloom.app', 'Contents', 'Resources', 'app.asar'),
  ];
  const archive = places.find((place) => existsSync(place));
  assert.ok(archive !== undefined, 'Packing made no app.asar.');
  return archive;
};

const checkFiles = () => {
  const wanted = ['LICENSE', 'dist/main/electron-main.js', 'dist/main/preload.cjs', 'assets/icon/icon.png'];
  for (const file of wanted) assert.ok(existsSync(join(program, file)), `${file} is not in the package.`);
};

/** Starts the packed browser host; resolves with the process and the address it prints. */
const startHost = () =>
  new Promise((resolve, reject) => {
    const words = [join(program, 'dist', 'main', 'browser-host.js'), '--no-window'];
    const host = spawn(process.execPath, words, { cwd: outside, env: environment });
    let printed = '';
    const timer = setTimeout(() => {
      host.kill('SIGKILL');
      reject(new Error(`The browser host printed no address:\n${printed}`));
    }, PATIENCE_MS);
    const listen = (text) => {
      printed += text;
      const address = /http:\/\/127\.0\.0\.1:\d+\/\S*(?=\s)/.exec(printed)?.[0];
      if (address === undefined) return;
      clearTimeout(timer);
      resolve({ host, address });
    };
    host.stdout.setEncoding('utf8').on('data', listen);
    host.stderr.setEncoding('utf8').on('data', listen);
    host.once('exit', (code) => {
      clearTimeout(timer);
      reject(new Error(`The browser host ended with ${code}:\n${printed}`));
    });
  });

const checkHost = async () => {
  const { host, address } = await startHost();
  const ended = new Promise((resolve) => {
    host.once('exit', resolve);
  });
  try {
    const { origin } = new URL(address);
    const entry = await fetch(address, { redirect: 'manual' });
    const cookie = (entry.headers.get('set-cookie') ?? '').split(';')[0] ?? '';
    assert.notEqual(cookie, '', 'The first address gave no cookie.');

    const page = await fetch(`${origin}/`, { headers: { cookie } });
    assert.equal(page.status, 200);
    assert.match(page.headers.get('content-security-policy') ?? '', /default-src 'none'/);
    const text = await page.text();
    const script = /src="\.\/([^"]+\.js)"/.exec(text)?.[1];
    assert.ok(script !== undefined, `The page names no script:\n${text}`);
    assert.equal((await fetch(`${origin}/${script}`, { headers: { cookie } })).status, 200);

    const answer = await fetch(`${origin}/desk`, {
      method: 'POST',
      headers: { cookie, origin, 'content-type': 'application/json' },
      body: JSON.stringify({ request: 'about', ask: {} }),
    });
    const about = await answer.json();
    const { version } = JSON.parse(readFileSync(inRoot('package.json'), 'utf8'));
    assert.equal(about.ok, true);
    assert.equal(about.value.version, version);
    assert.equal(about.value.host, 'browser');
  } finally {
    host.kill('SIGTERM');
  }
  assert.equal(await ended, 0, 'The browser host did not end well.');
};

const checkPress = () => {
  const project = join(program, 'assets', 'sample-cohorts', 'ostrey-vale.normloom');
  const folder = join(outside, 'pressed');
  run([join(program, 'dist', 'main', 'command-line.js'), 'press', project, '--into', folder], outside);
  for (const file of [
    'booklet.pdf',
    'tables.xlsx',
    'tables.csv',
    'norm-set.json',
    'certificate.json',
    'certificate.pdf',
  ]) {
    assert.ok(statSync(join(folder, file)).size > 0, `${file} is empty.`);
  }
  const { 'read-back': readBack } = JSON.parse(readFileSync(join(folder, 'certificate.json'), 'utf8'));
  assert.ok(readBack['cells-compared'] > 1000 && readBack.differences === 0, 'The pressed files were not read back.');
};

try {
  pack();
  checkFiles();
  await checkHost();
  checkPress();
  console.log('The packed program serves its page and presses its sample under plain Node.');
} finally {
  rmSync(outside, { recursive: true, force: true });
}
