import { mkdirSync } from 'node:fs';
import { chromium } from 'playwright-core';
import { createServer } from 'vite';

// Pictures of the gallery, for eyes. `node tests/gallery/look.mjs OUT page?query@WIDTHxHEIGHT ...`
const [out = '/tmp/holdoff-gallery', ...shots] = process.argv.slice(2);
mkdirSync(out, { recursive: true });

const server = await createServer({
  configFile: new URL('./vite.config.ts', import.meta.url).pathname,
  logLevel: 'error',
});
await server.listen();
const browser = await chromium.launch({
  executablePath: '/usr/bin/chromium',
  args: [
    '--headless',
    '--no-sandbox',
    '--disable-gpu',
    '--disable-quic',
    '--no-first-run',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
  ],
});
try {
  for (const shot of shots) {
    const [query = 'gap', size = '1180x820'] = shot.split('@');
    const [width, height] = size.split('x').map(Number);
    const page = await browser.newPage({ viewport: { width, height } });
    page.on('pageerror', (error) => process.stderr.write(`${shot}: ${error.message}\n`));
    page.on('console', (message) => {
      if (message.type() === 'error') process.stderr.write(`${shot}: ${message.text()}\n`);
    });
    await page.goto(`http://127.0.0.1:18200/?page=${query.replace('?', '&')}`, { waitUntil: 'networkidle' });
    await page.evaluate(() => document.fonts.ready);
    const name = shot.replace(/[^a-z0-9]+/gi, '-');
    await page.screenshot({ path: `${out}/${name}.png` });
    await page.close();
  }
} finally {
  await browser.close();
  await server.close();
}
