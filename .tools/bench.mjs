// npm run bench: times likelihood evaluations and whole fits, prints a table and, as its last line, one JSON object.
import { installPackages } from './install.mjs';

installPackages();
const { runnerImport } = await import('vite');
const { module } = await runnerImport('./test/bench/bench.ts', { configFile: false, logLevel: 'error' });
module.bench((line) => console.log(line));
