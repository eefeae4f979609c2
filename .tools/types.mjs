// Checks the types of every room with the libraries that room is allowed to see.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

const rooms = ['tsconfig.json', 'workers', 'workers/entry', 'src', 'src/pure.tsconfig.json', 'test', 'e2e'];
let failed = 0;
for (const room of rooms.filter((path) => existsSync(path))) {
  const { status } = spawnSync(process.execPath, ['node_modules/typescript/bin/tsc', '-p', room], { stdio: 'inherit' });
  if (status !== 0) {
    console.error(`types: ${room} does not compile`);
    failed += 1;
  }
}
process.exit(failed === 0 ? 0 : 1);
