import { busName, elementById, elementName, isSeries, type Study } from '../../../study/index.ts';
import { cells, NONE } from '../cells.ts';
import { fixed, significant } from '../formatNumber.ts';
import type { Row, Section } from '../model.ts';
import { largest, readTerminal } from '../readings.ts';
import { type CaseView, type SheetView, solvedIn } from '../SheetView.ts';
import { senseOf } from '../sitePower.ts';

/** kW and kvar to four figures; what is noise beside the apparent power prints as nothing. */
function power(value: number, kVA: number): string {
  return Math.abs(value) < 5e-4 * kVA ? '0' : significant(value, 4);
}

/** Neutral current; what is noise beside the phase current prints as nothing. */
const neutral = (amperes: number, phaseA: number): string =>
  amperes < 1e-6 * phaseA ? '0' : significant(amperes, 3);

/** Sources and the lower ends of series parts are read in the direction energy usually leaves them. */
function leavesPart(study: Study, terminal: { element: string; bus: string }): boolean {
  const part = elementById(study, terminal.element);
  if (!part) return false;
  return isSeries(part) ? part.to === terminal.bus : part.kind === 'supply' || part.kind === 'generator';
}

function rowsOf(view: SheetView, item: CaseView): Row[] {
  const solution = solvedIn(item);
  if (!solution) {
    const why = item.computed?.solution.error ?? 'not computed';
    return [{ kind: 'group', text: item.name, aside: `no figures: ${why}` }];
  }
  const rows = solution.terminals.map((terminal, index) => {
    const reading = readTerminal(solution, index);
    const factor = (value: number | null): string => (value === null ? NONE : fixed(Math.abs(value), 3));
    const thd = largest(reading.thdPercent);
    const out = leavesPart(view.study, terminal);
    const [kW, kvar] = out ? [-reading.kW, -reading.kvar] : [reading.kW, reading.kvar];
    return cells(
      elementName(view.study, terminal.element),
      busName(view.study, terminal.bus),
      out ? 'out of' : 'into',
      power(kW, reading.kVA),
      power(kvar, reading.kVA),
      significant(reading.kVA, 4),
      significant(Math.max(...reading.rmsA), 4),
      terminal.fourWire ? neutral(reading.neutralRmsA, Math.max(...reading.rmsA)) : NONE,
      factor(reading.displacementPF),
      factor(reading.truePF),
      senseOf(kW, kvar),
      thd === undefined ? NONE : fixed(thd, 1),
    );
  });
  return [{ kind: 'group', text: item.name }, ...rows];
}

/** Powers, currents and power factors of every part in service, in every case. */
export function terminalsSection(view: SheetView): Section {
  return {
    id: 'terminals',
    title: 'Powers and currents by case',
    blocks: [
      {
        kind: 'table',
        columns: [
          { head: 'part', align: 'left', grow: 1 },
          { head: 'at busbar', align: 'left', grow: 1 },
          { head: 'flow, part', align: 'left' },
          { head: 'P', unit: 'kW', align: 'decimal' },
          { head: 'Q', unit: 'kvar', align: 'decimal' },
          { head: 'S_e', unit: 'kVA', align: 'decimal' },
          { head: 'I rms', unit: 'A', align: 'decimal' },
          { head: 'I_N rms', unit: 'A', align: 'decimal' },
          { head: 'cos φ', align: 'decimal' },
          { head: 'PF', align: 'decimal' },
          { head: 'sense', align: 'left' },
          { head: 'THD I', unit: '%', align: 'decimal' },
        ],
        rows: view.cases.flatMap((item) => rowsOf(view, item)),
        notes: [
          'Powers of sources and of the lower ends of transformers and cables are counted out of the part, all others into it. P and Q at the fundamental; S_e is the effective apparent power of IEEE 1459 and PF = P/S_e over all orders; cos φ is the displacement factor; I rms of the worst phase over all orders, I_N in the neutral of four-wire circuits. Lagging: kvar and kW of one sign.',
        ],
      },
    ],
  };
}
