// npm run fuzz -- [files] [seed]: reads many damaged files (100 000 unless said otherwise); see test/properties/readingFuzz.test.ts.
import { spawnSync } from 'node:child_process';

const [files = '100000', seed = String(Date.now() % 2 ** 31)] = process.argv.slice(2);
console.log(`${files} damaged files, seed ${seed}`);
const { status } = spawnSync(
  process.execPath,
  ['node_modules/vitest/vitest.mjs', 'run', 'test/properties/readingFuzz.test.ts'],
  {
    stdio: 'inherit',
    env: { ...process.env, FUZZ_FILES: files, FUZZ_SEED: seed },
  },
);
process.exit(status ?? 1);
