// npm run calibrate -- [topic] [--replicates N] [--seed S] [--designs TEXT]: measures what the program claims by simulation, on all
// cores. Progress goes to stderr; the table to stdout; the last line is one JSON object. Without a topic it lists them.
import { readdirSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import { parseArgs } from 'node:util';
import { isMainThread, parentPort, Worker, workerData } from 'node:worker_threads';
import { installPackages } from './install.mjs';

/** Replicates handed to a thread at once. */
const BLOCK = 20;

async function topicOf(name) {
  const { runnerImport } = await import('vite');
  const { module } = await runnerImport(`./test/calibration/${name}.ts`, { configFile: false, logLevel: 'error' });
  return module.topic;
}

/** A seed for each replicate of each design that no other shares. */
const seedOf = (seed, design, replicate) => seed * 1_000_003 + design * 10_000_019 + replicate;

if (isMainThread) await main();
else await serve();

async function serve() {
  const topic = await topicOf(workerData.topic);
  parentPort.on('message', ({ design, from, to }) => {
    const outcomes = [];
    for (let i = from; i < to; i++) outcomes.push(topic.run(topic.designs[design], seedOf(workerData.seed, design, i)));
    parentPort.postMessage({ design, from, outcomes });
  });
  parentPort.postMessage('ready');
}

async function main() {
  const { values, positionals } = parseArgs({
    allowPositionals: true,
    options: { replicates: { type: 'string' }, seed: { type: 'string' }, designs: { type: 'string' } },
  });
  const topics = readdirSync(new URL('../test/calibration', import.meta.url))
    .filter((file) => file.endsWith('.ts') && file !== 'topic.ts')
    .map((file) => file.slice(0, -3));
  const [name] = positionals;
  if (!topics.includes(name)) {
    console.log(`npm run calibrate -- topic [--replicates N] [--seed S]\ntopics: ${topics.join(', ')}`);
    process.exit(name === undefined ? 0 : 1);
  }
  installPackages();
  const topic = await topicOf(name);
  const replicates = Number(values.replicates ?? topic.replicates);
  const seed = Number(values.seed ?? 1);
  if (!(replicates >= 1) || !Number.isInteger(seed)) throw new RangeError('Replicates and seed must be whole numbers.');
  const wanted = topic.designs
    .map((design, index) => ({ design, index }))
    .filter(({ design }) => topic.describe(design).includes(values.designs ?? ''));
  const countOf = (index) => Math.ceil(replicates * (topic.share?.(topic.designs[index]) ?? 1));
  const outcomes = new Map(wanted.map(({ index }) => [index, new Array(countOf(index))]));
  const blocks = wanted.flatMap(({ index }) =>
    Array.from({ length: Math.ceil(countOf(index) / BLOCK) }, (_, b) => ({
      design: index,
      from: b * BLOCK,
      to: Math.min(countOf(index), (b + 1) * BLOCK),
    })),
  );
  await runBlocks(blocks, { topic: name, seed }, ({ design, from, outcomes: part }, done) => {
    part.forEach((outcome, i) => (outcomes.get(design)[from + i] = outcome));
    process.stderr.write(`\r${name}: ${done} of ${blocks.length} blocks, ${topic.describe(topic.designs[design])}    `);
  });
  process.stderr.write('\n');
  const rows = wanted.flatMap(({ design, index }) => topic.rows(design, outcomes.get(index)));
  for (const row of rows) console.log(lineOf(row));
  const judged = rows.filter(({ goal }) => goal !== null);
  console.log(
    `${judged.filter(passes).length} of ${judged.length} rows with a goal meet it, ${replicates} replicates, seed ${seed}`,
  );
  console.log(JSON.stringify({ topic: name, replicates, seed, rows }));
}

/** A row passes when what was observed, two standard errors either way, meets its goal. */
function passes({ goal, observed, standardError }) {
  return observed + 2 * standardError >= goal[0] && observed - 2 * standardError <= goal[1];
}

function lineOf(row) {
  const figure = `${row.observed.toFixed(4)} ± ${row.standardError.toFixed(4)}`;
  const goal = row.goal === null ? '' : `goal ${row.goal[0]} … ${row.goal[1]}  ${passes(row) ? 'met' : 'MISSED'}`;
  return `${row.name.padEnd(44)} ${row.design.padEnd(30)} ${figure.padEnd(20)} ${goal}`;
}

function runBlocks(blocks, workerData, take) {
  return new Promise((resolve, reject) => {
    let next = 0;
    let done = 0;
    const threads = Array.from({ length: Math.min(availableParallelism(), blocks.length) }, () => {
      const thread = new Worker(new URL(import.meta.url), { workerData });
      thread.on('error', reject);
      thread.on('message', (message) => {
        if (message !== 'ready') take(message, ++done);
        if (next < blocks.length) thread.postMessage(blocks[next++]);
        else void thread.terminate();
        if (done === blocks.length) resolve();
      });
      return thread;
    });
    if (threads.length === 0) resolve();
  });
}
