/**
 * Frame times while the crown is dragged for three seconds, in a real Chromium over the built page: the time between
 * frames as the page itself sees it, the 95th percentile and the worst.
 */
import { chromium, type Page } from '@playwright/test';
import { join } from 'node:path';
import { buildAll, buildIsStale, PROJECT_FOLDER } from '../../app/build.ts';
import { servePage } from '../../app/web/server.ts';
import { CHROMIUM, CHROMIUM_FLAGS, chromiumIsHere } from '../run/chromium.ts';

interface FrameTimes {
  readonly frames: number;
  /** ms */
  readonly median: number;
  readonly percentile95: number;
  readonly worst: number;
}

const SECONDS = 3;

/** Drags the crown up and down for three seconds. @param voussoirs of the arch that is dragged; its own where null */
async function dragFrames(voussoirs: number | null = null): Promise<FrameTimes> {
  const serving = await servePage(join(PROJECT_FOLDER, 'dist', 'renderer'), 0);
  const browser = await chromium.launch({ executablePath: CHROMIUM, args: CHROMIUM_FLAGS });
  try {
    const page = await browser.newPage({ viewport: { width: 1280, height: 800 } });
    await page.goto(serving.address);
    await page.getByTestId('headline').waitFor();
    if (voussoirs !== null) await countVoussoirs(page, voussoirs);
    return await measured(page);
  } finally {
    await browser.close();
    await serving.close();
  }
}

async function countVoussoirs(page: Page, voussoirs: number): Promise<void> {
  const field = page
    .getByRole('complementary', { name: 'Measured and assumed' })
    .getByLabel('Voussoirs', { exact: true });
  await field.fill(String(voussoirs));
  await field.press('Enter');
  await page.getByRole('button', { name: 'Undo' }).and(page.locator(':enabled')).waitFor();
}

async function measured(page: Page): Promise<FrameTimes> {
  const box = await page.getByRole('slider', { name: /^Rise/ }).boundingBox();
  if (box === null) throw new Error('the crown has no handle');
  const { x, y } = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x, y - 8);
  await page.evaluate(WATCH);
  const start = performance.now();
  for (let seconds = 0; seconds < SECONDS; seconds = (performance.now() - start) / 1000) {
    await page.mouse.move(x, y - 8 - 40 * (1 - Math.cos(2 * Math.PI * seconds)));
  }
  const gaps = await page.evaluate<readonly number[]>(RESULT);
  await page.mouse.up();
  return {
    frames: gaps.length,
    median: percentile(gaps, 0.5),
    percentile95: percentile(gaps, 0.95),
    worst: percentile(gaps, 1),
  };
}

/** Runs in the page, so it is text: notes the time from frame to frame. */
const WATCH = `
  window.watch = { running: true, gaps: [] };
  let last = performance.now();
  const frame = (now) => {
    watch.gaps.push(now - last);
    last = now;
    if (watch.running) requestAnimationFrame(frame);
  };
  requestAnimationFrame(frame);
`;

const RESULT = `(() => {
  watch.running = false;
  return watch.gaps.slice(1);
})()`;

function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? Number.NaN;
}

function framesInWords(name: string, times: FrameTimes): string {
  const ms = (value: number): string => `${value.toFixed(1)} ms`;
  return `${name}: ${times.frames} frames in ${SECONDS} s, median ${ms(times.median)}, 95 in 100 within ${ms(times.percentile95)}, worst ${ms(times.worst)}`;
}

if (chromiumIsHere()) {
  if (buildIsStale(PROJECT_FOLDER)) await buildAll('warn');
  console.log('\nFrames of a drag, 60 a second at best (16.7 ms)');
  console.log(framesInWords('Crown, sample arch', await dragFrames()));
  console.log(framesInWords('Crown, 200 voussoirs', await dragFrames(200)));
} else {
  console.log('\nFrames of a drag: not measured, there is no Chromium here.');
}
