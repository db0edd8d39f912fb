import type { ResultsCase, ResultsFile } from '../../src/engine/index.ts';

type Pair = [number, number];

/**
 * Where two results files differ by more than two independent implementations may:
 * |a − b| ≤ max(1e-7·|b|, 1e-9·G), G the largest magnitude of the quantity at that busbar in that case;
 * resonances: order 2e-6, ohm 1e-6, Q 1e-4 of the expected value. Checks are left out.
 */
export function disagreements(actual: ResultsFile, expected: ResultsFile): string[] {
  const found: string[] = [];
  const differ = (where: string, a: unknown, b: unknown): void => {
    found.push(`${where}: ${JSON.stringify(a)} instead of ${JSON.stringify(b)}`);
  };
  const same = (where: string, a: unknown, b: unknown): void => {
    if (JSON.stringify(a) !== JSON.stringify(b)) differ(where, a, b);
  };
  const near = (where: string, a: unknown, b: unknown, allowed: number): void => {
    const close = typeof a === 'number' && typeof b === 'number' && Math.abs(a - b) <= allowed;
    if (!close && !(a === null && b === null)) differ(where, a, b);
  };
  const list = (where: string, a: readonly (number | null)[], b: readonly (number | null)[]): void => {
    const largest = Math.max(0, ...b.map((value) => Math.abs(value ?? 0)));
    same(`${where} count`, a.length, b.length);
    b.forEach((value, i) => {
      near(`${where}[${i}]`, a[i], value, Math.max(1e-7 * Math.abs(value ?? 0), 1e-9 * largest));
    });
  };
  const phasors = (where: string, a: readonly Pair[][], b: readonly Pair[][]): void => {
    list(where, a.flat(2), b.flat(2));
  };

  same('format', [actual.format, actual.version], [expected.format, expected.version]);
  same('case ids', actual.cases.map(idOf), expected.cases.map(idOf));
  expected.cases.forEach((wanted, c) => {
    const got = actual.cases[c] as ResultsCase;
    const at = `case ${wanted.id}`;
    same(`${at} converged`, got.converged, wanted.converged);
    same(`${at} buses`, got.buses.map(idOf), wanted.buses.map(idOf));
    wanted.buses.forEach((bus, i) => {
      const other = got.buses[i] as typeof bus;
      same(`${at} ${bus.id} orders`, other.orders.map(orderOf), bus.orders.map(orderOf));
      phasors(
        `${at} ${bus.id} V`,
        other.orders.map(({ V }) => V),
        bus.orders.map(({ V }) => V),
      );
      for (const key of ['rmsV', 'rmsLL', 'thdPercent'] as const)
        list(`${at} ${bus.id} ${key}`, other[key], bus[key]);
    });
    same(`${at} terminals`, got.terminals.map(terminalOf), wanted.terminals.map(terminalOf));
    const largestAmperes = new Map<string, number>();
    for (const { bus, rmsA } of wanted.terminals) {
      largestAmperes.set(bus, Math.max(largestAmperes.get(bus) ?? 0, ...rmsA));
    }
    wanted.terminals.forEach((terminal, i) => {
      const other = got.terminals[i] as typeof terminal;
      const where = `${at} ${terminalOf(terminal)}`;
      const amperes = largestAmperes.get(terminal.bus) ?? 0;
      phasors(
        `${where} I`,
        other.orders.map(({ I }) => I),
        terminal.orders.map(({ I }) => I),
      );
      list(`${where} rmsA`, other.rmsA, terminal.rmsA);
      list(`${where} thdPercent`, other.thdPercent, terminal.thdPercent);
      near(
        `${where} neutralRmsA`,
        other.neutralRmsA,
        terminal.neutralRmsA,
        allowed(terminal.neutralRmsA, amperes),
      );
      for (const key of ['kW', 'kvar', 'kVA'] as const) {
        near(`${where} ${key}`, other[key], terminal[key], allowed(terminal[key], terminal.kVA));
      }
      for (const key of ['displacementPF', 'truePF'] as const) {
        near(`${where} ${key}`, other[key], terminal[key], allowed(terminal[key] ?? 0, 1));
      }
    });
    wanted.scans.forEach((scan, i) => {
      const other = got.scans[i] as typeof scan;
      const where = `${at} scan ${scan.bus} ${scan.sequence}`;
      same(`${where} error`, other.error === undefined, scan.error === undefined);
      list(
        `${where} f`,
        other.points.map(([f]) => f),
        scan.points.map(([f]) => f),
      );
      list(
        `${where} Z`,
        other.points.flatMap(([, re, im]) => [re, im]),
        scan.points.flatMap(([, re, im]) => [re, im]),
      );
      same(`${where} resonances`, other.resonances.map(kindOf), scan.resonances.map(kindOf));
      scan.resonances.forEach((resonance, r) => {
        const peak = other.resonances[r] as typeof resonance;
        near(`${where} order`, peak.order, resonance.order, 2e-6 * resonance.order);
        near(`${where} ohm`, peak.ohm, resonance.ohm, 1e-6 * resonance.ohm);
        near(`${where} Q`, peak.q, resonance.q, 1e-4 * (resonance.q ?? 0));
      });
    });
    same(`${at} scan count`, got.scans.length, wanted.scans.length);
  });
  return found;
}

const allowed = (value: number, largest: number): number => Math.max(1e-7 * Math.abs(value), 1e-9 * largest);
const idOf = ({ id }: { id: string }): string => id;
const orderOf = ({ h }: { h: number }): number => h;
const kindOf = ({ kind }: { kind: string }): string => kind;
const terminalOf = ({ element, bus }: { element: string; bus: string }): string => `${element}@${bus}`;
