// Holds the packed size of the bundles to its limit: what a user downloads, compressed.
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';

const LIMIT = 8 * 1024 * 1024;
const dist = fileURLToPath(new URL('../dist/', import.meta.url));
let packed = 0;
for (const name of ['client.js', 'server.js', 'cli.js']) {
  const bytes = readFileSync(`${dist}${name}`);
  const size = gzipSync(bytes).length;
  packed += size;
  console.log(
    `${name.padEnd(10)} ${(bytes.length / 2 ** 20).toFixed(2)} MiB, packed ${(size / 2 ** 20).toFixed(2)} MiB`,
  );
}
console.log(`together packed ${(packed / 2 ** 20).toFixed(2)} MiB of ${LIMIT / 2 ** 20} MiB`);
process.exit(packed <= LIMIT ? 0 : 1);
