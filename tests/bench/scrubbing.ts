import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { resolve } from 'node:path';
import { chromium, type Page } from '@playwright/test';

const root = resolve(import.meta.dirname, '../..');
const port = 4187;
const executablePath = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium';

export interface Scrubbing {
  frames: number;
  /** Frames that came more than one and a half periods after the one before. */
  late: number;
  medianMs: number;
  worstMs: number;
  /** Longest task of the main thread while scrubbing; below 50 ms the browser reports none. */
  longestTaskMs: number;
}

/** Drags the rail's handle from end to end for about two seconds, one movement a frame. */
async function scrub(page: Page): Promise<Scrubbing> {
  await page.evaluate(() => {
    const seen: { frames: number[]; tasks: number[] } = { frames: [], tasks: [] };
    Object.assign(window, { seen });
    new PerformanceObserver((list) => {
      for (const entry of list.getEntries()) seen.tasks.push(entry.duration);
    }).observe({ entryTypes: ['longtask'] });
  });
  const found = await page.evaluate(async () => {
    const plot = document.querySelector('.rail-plot');
    if (!plot) throw new Error('no rail on the page');
    const box = plot.getBoundingClientRect();
    const at = (share: number) => ({
      clientX: box.left + 60 + share * (box.width - 120),
      clientY: box.top + box.height / 2,
      pointerId: 1,
      bubbles: true,
      button: 0,
      buttons: 1,
      isPrimary: true,
    });
    const { seen } = window as unknown as { seen: { frames: number[]; tasks: number[] } };
    plot.dispatchEvent(new PointerEvent('pointerdown', at(0)));
    await new Promise<void>((done) => {
      const step = (time: number) => {
        seen.frames.push(time);
        const share = seen.frames.length / 120;
        plot.dispatchEvent(new PointerEvent('pointermove', at(share < 1 ? share : 2 - share)));
        if (seen.frames.length < 240) requestAnimationFrame(step);
        else done();
      };
      requestAnimationFrame(step);
    });
    plot.dispatchEvent(new PointerEvent('pointerup', at(0)));
    return seen;
  });
  const gaps = found.frames.slice(1).map((time, index) => time - (found.frames[index] ?? time));
  const sorted = [...gaps].sort((a, b) => a - b);
  const medianMs = sorted[Math.floor(sorted.length / 2)] ?? 0;
  return {
    frames: gaps.length,
    late: gaps.filter((gap) => gap > 1.5 * (1000 / 60)).length,
    medianMs,
    worstMs: sorted.at(-1) ?? 0,
    longestTaskMs: Math.max(0, ...found.tasks),
  };
}

/** Scrubs the built page with a sample; null with words where the page or the browser is missing. */
export async function measureScrubbing(sample: string): Promise<Scrubbing | string> {
  if (!existsSync(executablePath)) return 'no Chromium here: scrubbing not measured';
  if (!existsSync(resolve(root, 'dist/index.html'))) return 'no build in dist: run npm run build first';
  const server = spawn('npx', ['vite', 'preview', '--port', String(port), '--strictPort'], {
    cwd: root,
    stdio: 'ignore',
    detached: true,
  });
  const browser = await chromium.launch({
    executablePath,
    args: ['--no-sandbox', '--disable-gpu', '--disable-quic'],
  });
  try {
    const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
    // The loader that runs this script names functions by a call the page does not have.
    await page.addInitScript('globalThis.__name = (named) => named');
    for (let tries = 0; tries < 40; tries += 1) {
      const reached = await page.goto(`http://localhost:${port}/?sample=${sample}`).catch(() => null);
      if (reached) break;
      await page.waitForTimeout(250);
    }
    await page.locator('.count[data-verdict="fail"]', { hasText: /\d+ in all/ }).waitFor();
    await scrub(page);
    return await scrub(page);
  } finally {
    await browser.close();
    if (server.pid) process.kill(-server.pid);
  }
}
