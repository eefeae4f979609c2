// npm test: installs what is missing, then format, types, lint, unit and reference tests, and the end-to-end tests on
// the built page. Ends with one line: N passed, N failed.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { findChromium, installPackages } from './install.mjs';

installPackages();
const chromium = await findChromium();
const out = '.out';
rmSync(out, { recursive: true, force: true });
mkdirSync(out);

const total = { passed: 0, failed: 0, skipped: 0 };
const bin = (path) => `node_modules/${path}`;

function run(title, args, env = {}) {
  console.log(`\n— ${title}`);
  const started = Date.now();
  const { status } = spawnSync(process.execPath, args, { stdio: 'inherit', env: { ...process.env, ...env } });
  console.log(`  ${title}: ${status === 0 ? 'ok' : 'failed'} in ${((Date.now() - started) / 1000).toFixed(1)} s`);
  return status === 0;
}

/** A check that is one yes or no. */
function check(title, args) {
  if (run(title, args)) total.passed += 1;
  else total.failed += 1;
}

/** A runner that writes its own counts; no counts at all is a failure. */
function suite(title, args, report, count, env) {
  const ok = run(title, args, env);
  if (!existsSync(report)) {
    total.failed += 1;
    return;
  }
  const { passed, failed, skipped } = count(JSON.parse(readFileSync(report, 'utf8')));
  total.passed += passed;
  total.failed += failed + (!ok && failed === 0 ? 1 : 0) + (passed === 0 ? 1 : 0);
  total.skipped += skipped;
}

check('Format', [bin('prettier/bin/prettier.cjs'), '--check', '--log-level', 'warn', '.']);
check('Types', ['.tools/types.mjs']);
check('Lint', [bin('eslint/bin/eslint.js'), '--config', '.config/eslint.config.js', '.']);
suite(
  'Unit and reference tests',
  [bin('vitest/vitest.mjs'), 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${out}/unit.json`],
  `${out}/unit.json`,
  (r) => ({
    passed: r.numPassedTests,
    failed: r.numFailedTests + r.numFailedTestSuites * (r.numFailedTests === 0),
    skipped: r.numPendingTests + r.numTodoTests,
  }),
);
check('Build', [bin('vite/bin/vite.js'), 'build', '--logLevel', 'warn']);
suite(
  'End-to-end tests on the built page',
  [bin('@playwright/test/cli.js'), 'test', '--config', 'e2e/playwright.config.ts'],
  `${out}/e2e.json`,
  (r) => ({ passed: r.stats.expected + r.stats.flaky, failed: r.stats.unexpected, skipped: r.stats.skipped }),
  { CHROMIUM_PATH: chromium },
);

if (process.env.CI && total.skipped > 0) {
  console.log(`\n${total.skipped} tests were skipped; on CI that counts as failed.`);
  total.failed += total.skipped;
  total.skipped = 0;
}
console.log(`\n${total.passed} passed, ${total.failed} failed${total.skipped > 0 ? `, ${total.skipped} skipped` : ''}`);
process.exit(total.failed === 0 ? 0 : 1);
