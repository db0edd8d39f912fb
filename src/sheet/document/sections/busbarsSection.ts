import { nameOf } from '../../../study/index.ts';
import { cells, NONE } from '../cells.ts';
import { fixed, significant } from '../formatNumber.ts';
import type { Row, Section } from '../model.ts';
import { fundamentalVolts, largest, readBus } from '../readings.ts';
import { type CaseView, type SheetView, solvedIn, solvedWithout } from '../SheetView.ts';

const percent = (value: number | undefined): string => (value === undefined ? NONE : fixed(value, 2));

/** U1 as per cent of nominal: one figure where the phases agree, lowest and highest where they do not. */
function fundamentalPercent(volts: readonly number[] | undefined, nominalV: number): string {
  if (!volts) return NONE;
  const shares = volts.map((value) => (value * Math.sqrt(3) * 100) / nominalV);
  const [low, high] = [Math.min(...shares), Math.max(...shares)];
  return high - low < 0.05 ? fixed(high, 1) : `${fixed(low, 1)} … ${fixed(high, 1)}`;
}

function rowsOf(view: SheetView, item: CaseView): Row[] {
  const solution = solvedIn(item);
  const group: Row = { kind: 'group', text: item.name };
  if (!solution) {
    const why = item.computed?.solution.error ?? 'not computed';
    return [{ ...group, aside: `no figures: ${why}` }];
  }
  const bare = solvedWithout(item);
  const rows = view.study.buses.map((bus) => {
    const reading = readBus(solution, bus.id);
    if (!reading) return cells(nameOf(bus), NONE, NONE, NONE, NONE, NONE, NONE, NONE);
    const [u12, u23, u31] = reading.rmsLL.map((value) => significant(value, 4));
    const without = bare ? readBus(bare, bus.id) : undefined;
    return cells(
      nameOf(bus),
      u12 ?? NONE,
      u23 ?? NONE,
      u31 ?? NONE,
      fundamentalPercent(fundamentalVolts(solution, bus.id), bus.nominalV),
      percent(largest(reading.thdPercent)),
      bare ? fundamentalPercent(fundamentalVolts(bare, bus.id), bus.nominalV) : NONE,
      percent(without ? largest(without.thdPercent) : undefined),
    );
  });
  return [group, ...rows];
}

/** Voltages and distortion of every busbar in every case, with the correction and without. */
export function busbarsSection(view: SheetView): Section {
  return {
    id: 'busbars',
    title: 'Busbars by case',
    blocks: [
      {
        kind: 'table',
        columns: [
          { head: 'busbar', align: 'left', grow: 2 },
          { head: 'U12 rms', unit: 'V', align: 'right', grow: 1 },
          { head: 'U23 rms', unit: 'V', align: 'right', grow: 1 },
          { head: 'U31 rms', unit: 'V', align: 'right', grow: 1 },
          { head: 'U1', unit: '% of U_n', align: 'right', grow: 1 },
          { head: 'THD, worst phase', unit: '% of U1', align: 'decimal', grow: 1 },
          { head: 'U1 without correction', unit: '% of U_n', align: 'right', grow: 1 },
          { head: 'THD without correction', unit: '% of U1', align: 'decimal', grow: 1 },
        ],
        rows: view.cases.flatMap((item) => rowsOf(view, item)),
        notes: [
          `rms over all orders, line to line. U1: fundamental, line to neutral referred to U_n/√3; lowest … highest phase where they differ. ${NONE} not computed, without a source, or no fundamental.`,
        ],
      },
    ],
  };
}
