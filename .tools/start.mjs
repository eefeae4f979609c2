// npm start: installs what is missing, builds the page, serves it on localhost and prints the address.
import { installPackages } from './install.mjs';

installPackages();
const { build, preview } = await import('vite');
console.log('Building the page …');
await build({ logLevel: 'warn' });
const server = await preview({
  logLevel: 'warn',
  preview: { host: 'localhost', port: Number(process.env.PORT ?? 4173), strictPort: process.env.PORT !== undefined },
});
const address = server.resolvedUrls?.local[0] ?? 'http://localhost:4173/';
console.log(`\nLagwright is ready at ${address}\n(stop it with Ctrl+C; the data you open never leave this machine)`);
