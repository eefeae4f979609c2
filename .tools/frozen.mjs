// npm run frozen -- [from] [to] [climbs]: searches the frozen records and improves the stored maxima by so many climbs of
// the widest search each (none unless said otherwise); see test/reference/frozenSearch.test.ts.
import { spawnSync } from 'node:child_process';

const [from = '0', to = '1000', climbs = '0'] = process.argv.slice(2);
const { status } = spawnSync(
  process.execPath,
  ['node_modules/vitest/vitest.mjs', 'run', 'test/reference/frozenSearch.test.ts', '--disable-console-intercept'],
  { stdio: 'inherit', env: { ...process.env, FROZEN_FROM: from, FROZEN_TO: to, FROZEN_CLIMBS: climbs } },
);
process.exit(status ?? 1);
