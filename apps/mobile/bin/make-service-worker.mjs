// Writes sw.js into an export: it keeps the whole app on the device, so that Site works where there is no signal.
import { join } from 'node:path';
import { generateSW } from 'workbox-build';

const folder = process.argv[2];
const { count, size, warnings } = await generateSW({
  globDirectory: folder,
  globPatterns: ['index.html', '*.svg', '*.webmanifest', '_expo/**/*.{js,css}', 'assets/__node_modules/.pnpm/**/*.ttf'],
  globIgnores: ['**/*.map', 'sw.js'],
  dontCacheBustURLsMatching: /[-.][0-9a-f]{32}\./, // Metro puts a content hash into the name
  maximumFileSizeToCacheInBytes: 5_000_000,
  swDest: join(folder, 'sw.js'),
  inlineWorkboxRuntime: true,
  sourcemap: false,
  navigateFallback: '/index.html',
  navigateFallbackDenylist: [/^\/api\//],
  // A new version waits until the person agrees: taking over at once would pull the scripts from under an open page.
  skipWaiting: false,
  clientsClaim: true,
  cleanupOutdatedCaches: true,
});
console.log(`Kept for use without a network: ${count} files, ${Math.round(size / 1000)} kB.`);
if (warnings.length > 0) throw new Error(warnings.join('\n'));
