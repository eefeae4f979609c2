// Installs what is missing: the packages of the lock file and, for the tests, a Chromium.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { accessSync, constants, existsSync, readFileSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';

const stamp = 'node_modules/.installed-lock';
const run = (command, args, options = {}) =>
  spawnSync(command, args, { stdio: 'inherit', shell: process.platform === 'win32', ...options });

/** Runs `npm ci` unless node_modules already matches the lock file. */
export function installPackages() {
  const lock = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return;
  console.log('Installing the packages of package-lock.json (once) …');
  const { status } = run('npm', ['ci', '--no-fund', '--no-audit']);
  if (status !== 0) {
    console.error('npm ci failed: is the npm registry reachable? Nothing else was changed; run the command again.');
    process.exit(1);
  }
  writeFileSync(stamp, lock);
}

const names = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'chrome'];
const fixedPlaces = [
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  'C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe',
];

function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

function onThisMachine() {
  const fromPath = (process.env.PATH ?? '')
    .split(delimiter)
    .flatMap((folder) => names.map((name) => join(folder, name)));
  return [process.env.CHROMIUM_PATH ?? '', ...fromPath, ...fixedPlaces].find(
    (path) => path !== '' && isExecutable(path),
  );
}

async function fromPlaywright() {
  const { chromium } = await import('@playwright/test');
  const path = chromium.executablePath();
  return existsSync(path) ? path : undefined;
}

/**
 * Path of a Chromium for the tests: one already on the machine, else the one Playwright downloads, else Debian's
 * package. Says what it does; exits with a sentence when none can be had.
 */
export async function findChromium() {
  const present = onThisMachine() ?? (await fromPlaywright());
  if (present !== undefined) return present;
  console.log('No Chromium found; asking Playwright to download one …');
  if (run('npx', ['playwright', 'install', 'chromium']).status === 0) {
    const downloaded = await fromPlaywright();
    if (downloaded !== undefined) return downloaded;
  }
  if (existsSync('/usr/bin/apt-get') && process.getuid?.() === 0) {
    console.log("Playwright could not download one; installing Debian's chromium package …");
    run('apt-get', ['update', '-qq']);
    run('apt-get', ['install', '-y', '-qq', 'chromium']);
    const installed = onThisMachine();
    if (installed !== undefined) return installed;
  }
  console.error(
    'No Chromium could be installed. Install one, or set CHROMIUM_PATH to its program, and run npm test again.',
  );
  process.exit(1);
}
