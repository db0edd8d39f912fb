import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { type ResultsCase, type ResultsFile, solveCase, solveStudy } from '../../src/engine/index.ts';
import type { Study } from '../../src/study/index.ts';

/**
 * Three studies solved by an independent dense implementation of the study format. Tolerance of the
 * format: |a − b| ≤ max(1e-7·|b|, 1e-9·G), G the largest magnitude of the quantity at that busbar in that
 * case; a resonance's order to 2e-6, its ohms to 1e-6 and its Q to 1e-4, relative.
 */
const folder = join(import.meta.dirname, 'studies');
const names = ['1-detuned-400v', '2-four-wire-480v', '3-filters-6k6-alpha'];

function read<T>(name: string): T {
  return JSON.parse(readFileSync(join(folder, name), 'utf8')) as T;
}

/** Largest difference in tolerances between two lists of numbers of one quantity. */
function misfit(got: readonly (number | null)[], want: readonly (number | null)[], largest: number): number {
  expect(got.length).toBe(want.length);
  return Math.max(
    0,
    ...want.map((b, k) => {
      const a = got[k] ?? null;
      if (a === null || b === null) return a === b ? 0 : Number.POSITIVE_INFINITY;
      return a === b ? 0 : Math.abs(a - b) / Math.max(1e-7 * Math.abs(b), 1e-9 * largest);
    }),
  );
}

const size = (values: readonly (number | null)[]): number => Math.max(...values.map((v) => Math.abs(v ?? 0)));
const voltsOf = (bus: ResultsCase['buses'][number]): number[] => bus.orders.flatMap(({ V }) => V.flat());
const ampsOf = (t: ResultsCase['terminals'][number]): number[] => t.orders.flatMap(({ I }) => I.flat());

for (const name of names) {
  describe(`reference study ${name}`, () => {
    const study = read<Study>(`${name}.json`);
    const want = read<ResultsFile>(`${name}.expected.json`);
    const got = solveStudy(study);

    it('has the same cases, busbars, terminals and scans in the same order', () => {
      const outline = (file: ResultsFile): unknown =>
        file.cases.map((c) => ({
          id: c.id,
          converged: c.converged,
          buses: c.buses.map(({ id, orders }) => [id, orders.length]),
          terminals: c.terminals.map(({ element, bus, orders }) => [element, bus, orders.length]),
          scans: c.scans.map(({ bus, sequence, points, error }) => [bus, sequence, points.length, error]),
        }));
      expect(outline(got)).toEqual(outline(want));
      for (const warning of want.warnings) expect(got.warnings).toContain(warning);
    });

    want.cases.forEach((b, index) => {
      const a = got.cases[index] as ResultsCase;

      it(`agrees on the voltages of case ${b.id}`, () => {
        b.buses.forEach((bus, k) => {
          const mine = a.buses[k] as (typeof a.buses)[number];
          expect(misfit(voltsOf(mine), voltsOf(bus), size(voltsOf(bus)))).toBeLessThan(1);
          expect(misfit(mine.rmsV, bus.rmsV, size(bus.rmsV))).toBeLessThan(1);
          expect(misfit(mine.rmsLL, bus.rmsLL, size(bus.rmsLL))).toBeLessThan(1);
          expect(misfit(mine.thdPercent, bus.thdPercent, size(bus.thdPercent))).toBeLessThan(1);
        });
      });

      it(`agrees on the currents and readings of case ${b.id}`, () => {
        b.terminals.forEach((terminal, k) => {
          const mine = a.terminals[k] as (typeof a.terminals)[number];
          const beside = b.terminals.filter(({ bus }) => bus === terminal.bus);
          const largest = Math.max(...beside.map((t) => size(ampsOf(t))));
          expect(misfit(ampsOf(mine), ampsOf(terminal), largest)).toBeLessThan(1);
          expect(misfit(mine.rmsA, terminal.rmsA, largest)).toBeLessThan(1);
          expect(misfit([mine.neutralRmsA], [terminal.neutralRmsA], largest)).toBeLessThan(1);
          expect(misfit(mine.thdPercent, terminal.thdPercent, size(terminal.thdPercent))).toBeLessThan(1);
          const power = Math.max(...beside.map(({ kVA }) => kVA));
          const powers = (t: typeof terminal): number[] => [t.kW, t.kvar, t.kVA];
          expect(misfit(powers(mine), powers(terminal), power)).toBeLessThan(1);
          const factors = (t: typeof terminal): (number | null)[] => [t.displacementPF, t.truePF];
          expect(misfit(factors(mine), factors(terminal), 1)).toBeLessThan(1);
        });
      });

      it(`agrees on the scans and resonances of case ${b.id}`, () => {
        b.scans.forEach((scan, k) => {
          const mine = a.scans[k] as (typeof a.scans)[number];
          expect(misfit(mine.points.flat(), scan.points.flat(), size(scan.points.flat()))).toBeLessThan(1);
          expect(mine.resonances.map(({ kind }) => kind)).toEqual(scan.resonances.map(({ kind }) => kind));
          scan.resonances.forEach((resonance, r) => {
            const found = mine.resonances[r] as typeof resonance;
            expect(Math.abs(found.order - resonance.order)).toBeLessThan(2e-6);
            expect(Math.abs(found.ohm / resonance.ohm - 1)).toBeLessThan(1e-6);
            if (resonance.q === null) expect(found.q).toBeNull();
            else expect(Math.abs((found.q ?? 0) / resonance.q - 1)).toBeLessThan(1e-4);
          });
        });
      });

      it(`gives the same in phase coordinates in case ${b.id}`, () => {
        const phase = solveCase(study, b.id, { coordinates: 'phase' });
        const three = phase.maxOrder * 3;
        b.buses.forEach((bus, k) => {
          const mine = [...phase.voltage.re.subarray(k * three, (k + 1) * three)].flatMap((re, c) => [
            re,
            phase.voltage.im[k * three + c] as number,
          ]);
          expect(misfit(mine, voltsOf(bus), size(voltsOf(bus)))).toBeLessThan(1);
        });
      });
    });
  });
}
