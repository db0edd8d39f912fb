import { execFileSync } from 'node:child_process';
import { cpus } from 'node:os';
import { resolve } from 'node:path';
import { elasticityTime, scanTime } from './engineFigures.ts';
import { kernelFigure, sequenceRefactor } from './kernelFigures.ts';
import { buildYardstick } from './kluYardstick.ts';
import { measureScrubbing } from './scrubbing.ts';

/** The benchmark: `npm run bench`. Ratios are of medians taken alternately in this one run. */

const yardstick = buildYardstick();
console.log(`Node ${process.version}, ${cpus().length} × ${cpus()[0]?.model ?? 'unknown processor'}`);
if ('missing' in yardstick) console.log(`No native yardstick, no ratios: ${yardstick.missing}.`);
console.log(line('figure', 'measured', 'target'));

const kernel = [30, 100, 300, 1000].map((busbars) => {
  const figure = kernelFigure(busbars, yardstick);
  const { refactor, oneSolve, threeSolves, residual, ratios } = figure;
  report(
    `${busbars} busbars, refactor`,
    us(refactor) + beside(ratios?.refactor),
    busbars > 100 ? '' : '≤ 0.60',
  );
  report(`${busbars} busbars, refactor + 1 solve`, us(oneSolve) + beside(ratios?.oneSolve));
  report(`${busbars} busbars, refactor + 3 solves`, us(threeSolves) + beside(ratios?.threeSolves));
  report(`${busbars} busbars, normalised residual`, residual.toExponential(1));
  return refactor / busbars;
});
if (!('missing' in yardstick)) yardstick.close();
report('30 → 1000 busbars, refactor per busbar', `${spread(kernel).toFixed(2)} times`, '≤ 1.6');
report('30 busbars, one sequence network, refactor', us(sequenceRefactor(30)));
report('30 busbars, scan of 2000 points, balanced', ms(scanTime(30, 2000, true)), '≤ 15 ms');
report('30 busbars, scan of 2000 points, unbalanced', ms(scanTime(30, 2000, false)), '≤ 15 ms');
report('30 busbars, what moves a resonance', ms(elasticityTime(30)));
const whole = [30, 100, 300, 1000].map((busbars) => {
  const time = aloneInItsProcess(busbars);
  report(`${busbars} busbars × 50 orders, edit to results`, ms(time), busbars === 30 ? '≤ 8 ms' : '');
  return time / busbars;
});
report('30 → 1000 busbars, edit to results per busbar', `${spread(whole).toFixed(2)} times`, '≤ 1.6');

const scrubbing = await measureScrubbing('cold-store');
if (typeof scrubbing === 'string') report('scrubbing in the page', scrubbing);
else {
  report('scrubbing, late frames', `${scrubbing.late} of ${scrubbing.frames}`, '0');
  report('scrubbing, frame, median and worst', `${ms(scrubbing.medianMs)}, ${ms(scrubbing.worstMs)}`);
  report('scrubbing, longest task of the page', longTask(scrubbing.longestTaskMs), '≤ 50 ms');
}

function aloneInItsProcess(busbars: number): number {
  const script = resolve(import.meta.dirname, 'oneSite.ts');
  return Number(
    execFileSync(process.execPath, ['--import', 'tsx', script, String(busbars)], { encoding: 'utf8' }),
  );
}

function longTask(milliseconds: number): string {
  return milliseconds === 0 ? 'none over 50 ms' : ms(milliseconds);
}

function us(x: number): string {
  return `${x < 10 ? x.toFixed(2) : x.toFixed(1)} µs`;
}

function ms(x: number): string {
  return `${x.toFixed(2)} ms`;
}

function beside(ratio: number | undefined): string {
  return ratio === undefined ? '' : `, ${ratio.toFixed(2)} of native`;
}

/** Largest over smallest. */
function spread(values: number[]): number {
  return Math.max(...values) / Math.min(...values);
}

function report(figure: string, measured: string, target = ''): void {
  console.log(line(figure, measured, target));
}

function line(figure: string, measured: string, target: string): string {
  return `${figure.padEnd(48)}${measured.padEnd(28)}${target}`.trimEnd();
}
