import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';

const limitKb = 200;
/** The Bench itself; its other screens, what else is due, the physics of its pins and what somebody pinned arrive after it is drawn. */
const routePattern = /^src\/features\/bench\/bench-route/;

/**
 * What has to arrive before the Bench can be drawn on a first visit: the entry, all that it imports
 * statically, and the chunks of the Bench with all that those import statically.
 * @param {string} root
 * @returns {import('./stages.mjs').Result}
 */
export function measureCriticalPath(root) {
  const dist = path.join(root, 'dist');
  const manifestFile = path.join(dist, '.vite', 'manifest.json');
  if (!existsSync(manifestFile)) return { passed: 0, failed: 1, note: 'no build to measure' };
  /** @type {Record<string, {file: string, src?: string, isEntry?: boolean, imports?: string[]}>} */
  const manifest = JSON.parse(readFileSync(manifestFile, 'utf8'));
  const starts = Object.entries(manifest)
    .filter(([key, chunk]) => chunk.isEntry === true || routePattern.test(chunk.src ?? key))
    .map(([key]) => key);
  const files = [...closure(manifest, starts)]
    .map((key) => manifest[key]?.file ?? '')
    .filter((file) => file.endsWith('.js'));
  const sizes = files.map((file) => ({
    file,
    kB: gzipSync(readFileSync(path.join(dist, file))).length / 1000,
  }));
  const total = sizes.reduce((sum, size) => sum + size.kB, 0);
  for (const { file, kB } of sizes) console.log(`   ${kB.toFixed(1).padStart(7)} kB  ${file}`);
  console.log(`   ${total.toFixed(1).padStart(7)} kB  gzip in all, limit ${limitKb} kB`);
  const fits = total > 0 && total < limitKb;
  return { passed: fits ? 1 : 0, failed: fits ? 0 : 1, note: `${total.toFixed(1)} kB of ${limitKb} kB` };
}

/**
 * @param {Record<string, {imports?: string[]}>} manifest
 * @param {readonly string[]} starts
 */
function closure(manifest, starts) {
  const seen = new Set();
  const waiting = [...starts];
  for (let key = waiting.pop(); key !== undefined; key = waiting.pop()) {
    if (seen.has(key)) continue;
    seen.add(key);
    waiting.push(...(manifest[key]?.imports ?? []));
  }
  return seen;
}
