// The figures of the README, measured on this machine: `npm run figures`. A cold start here has its packages and export already;
// what a fresh clone adds is the installation of packages and Debian programs, which depends on the network.
import { openBrowser } from '../support/browser.ts';
import { newFolder, type RunningApp, removeFolder, startApp } from '../support/running-app.ts';

const folder = newFolder();
const [cold, first] = await timed(() => startApp(folder));
await first.stop();
const [warm, app] = await timed(() => startApp(folder));
const browser = await openBrowser();
try {
  console.log(`first start, with a new cluster and the demonstration made: ${cold.toFixed(1)} s`);
  console.log(`second start, data kept: ${warm.toFixed(1)} s`);
  console.log(`script of the first page, compressed: ${(await firstPage(app)).toFixed(0)} kB`);
  console.log(await estimates(app));
} finally {
  await browser.close();
  await app.stop();
  removeFolder(folder);
}

async function timed<Result>(work: () => Promise<Result>): Promise<[seconds: number, result: Result]> {
  const start = performance.now();
  const result = await work();
  return [(performance.now() - start) / 1000, result];
}

async function firstPage({ address }: RunningApp): Promise<number> {
  const page = await browser.newPage();
  let bytes = 0;
  const protocol = await page.context().newCDPSession(page);
  const scripts = new Set<string>();
  await protocol.send('Network.enable');
  protocol.on('Network.responseReceived', ({ requestId, type }) => void (type === 'Script' && scripts.add(requestId)));
  protocol.on('Network.loadingFinished', ({ requestId, encodedDataLength }) => {
    if (scripts.has(requestId)) bytes += encodedDataLength;
  });
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail address').waitFor();
  await page.close();
  return bytes / 1000;
}

/** Types into a peak of a cable and reads how long the device's own estimates took. */
async function estimates({ address, accounts }: RunningApp): Promise<string> {
  const page = await browser.newPage({ viewport: { width: 390, height: 844 } });
  const engineer = accounts.find(({ role }) => role === 'engineer')!;
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail address').fill(engineer.email);
  await page.getByLabel('Password', { exact: true }).fill(engineer.password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('link', { name: /Autumn survey/ }).click();
  await page.getByRole('link', { name: /^Cable W-07u/ }).click();
  const field = page.getByLabel('Frequency of mode 3');
  await field.waitFor();
  const typed = await field.inputValue();
  for (let round = 0; round < 5; round++) {
    await field.fill('');
    await field.pressSequentially(typed, { delay: 60 });
  }
  const durations = await page.evaluate(() => performance.getEntriesByName('strandnote.estimate').map(({ duration }) => duration));
  durations.sort((a, b) => a - b);
  const at = (share: number) => durations[Math.floor(share * (durations.length - 1))]!.toFixed(1);
  return `one estimate on the device while typing, ${durations.length} taken: median ${at(0.5)} ms, 95 % under ${at(0.95)} ms`;
}
