import { margin, type OrderRow, orderTable, type VerdictWord, verdictWord } from '../../../checks/index.ts';
import { type Bus, nameOf } from '../../../study/index.ts';
import { cells, NONE } from '../cells.ts';
import { entered, fixed } from '../formatNumber.ts';
import type { Block, Cell, Row, Section } from '../model.ts';
import { provenanceNote, sourceWithMark } from '../provenance.ts';
import { type CaseView, type SheetView, solvedIn, solvedWithout } from '../SheetView.ts';

/** Orders with less than this in every case are left out, and the note says so. */
const SHOWN_FROM_PERCENT = 0.05;
const CASES_PER_TABLE = 4;

interface BusOrders {
  bus: Bus;
  cases: CaseView[];
  /** By case: rows by order. */
  studied: Map<string, OrderRow[]>;
  bare: Map<string, OrderRow[]>;
  /** The limit set only informs at this busbar. */
  informs: boolean;
}

function ordersOf(view: SheetView, bus: Bus): BusOrders {
  const studied = new Map<string, OrderRow[]>();
  const bare = new Map<string, OrderRow[]>();
  for (const item of view.cases) {
    const solution = solvedIn(item);
    if (!solution || solution.deenergised.includes(bus.id)) continue;
    studied.set(item.id, orderTable(item.studyHere, solution, bus.id));
    const without = solvedWithout(item);
    if (without && !without.deenergised.includes(bus.id)) {
      bare.set(item.id, orderTable(item.studyHere, without, bus.id));
    }
  }
  const informs = view.verdicts.some(
    (verdict) => verdict.check === 'bus-order' && verdict.subject.id === bus.id && verdict.screening,
  );
  return { bus, cases: view.cases.filter(({ id }) => studied.has(id)), studied, bare, informs };
}

const wordOf = (percent: number, limit: number, informs: boolean): VerdictWord =>
  verdictWord(margin(percent, limit), informs);

const rowAt = (rows: readonly OrderRow[] | undefined, h: number): OrderRow | undefined =>
  rows?.find((row) => row.h === h);

function percentCell(row: OrderRow | undefined, informs: boolean): Cell {
  if (!row || row.percent === null) return { text: NONE };
  const cell: Cell = { text: fixed(row.percent, 2) };
  if (row.limit === null) return cell;
  const word = wordOf(row.percent, row.limit, informs);
  return word === 'pass' ? cell : { ...cell, mark: word, strong: true };
}

function worst(table: ReadonlyMap<string, OrderRow[]>, h: number): number | undefined {
  const values = [...table.values()].flatMap((rows) => rowAt(rows, h)?.percent ?? []);
  return values.length === 0 ? undefined : Math.max(...values);
}

function verdictCell(orders: BusOrders, h: number, limit: number | null): Cell {
  const value = worst(orders.studied, h);
  if (limit === null || value === undefined) return { text: 'no limit', mark: 'unknown' };
  const word = wordOf(value, limit, orders.informs);
  return { text: word, mark: word };
}

function presentOrders(orders: BusOrders): number[] {
  const present = new Set<number>();
  for (const rows of [...orders.studied.values(), ...orders.bare.values()]) {
    for (const { h, percent } of rows) if ((percent ?? 0) >= SHOWN_FROM_PERCENT) present.add(h);
  }
  return [...present].sort((a, b) => a - b);
}

function tableOf(view: SheetView, orders: BusOrders, cases: readonly CaseView[], present: number[]): Block {
  const rows = present.map((h): Row => {
    const known = [...orders.studied.values()]
      .map((list) => rowAt(list, h))
      .find((row) => row?.limit != null);
    const limit = known?.limit ?? null;
    const bare = worst(orders.bare, h);
    return cells(
      String(h),
      fixed(h * view.study.frequencyHz, 0),
      limit === null ? NONE : entered(Number(limit.toPrecision(3))),
      ...cases.map((item) => percentCell(rowAt(orders.studied.get(item.id), h), orders.informs)),
      bare === undefined ? NONE : fixed(bare, 2),
      verdictCell(orders, h, limit),
    );
  });
  const sources = [...orders.studied.values()].flatMap((list) =>
    list.flatMap(({ h, source }) => (source && present.includes(h) ? [source] : [])),
  );
  const named = [...new Set(sources.map(sourceWithMark))].join('; ');
  return {
    kind: 'table',
    columns: [
      { head: 'order', align: 'right' },
      { head: 'frequency', unit: 'Hz', align: 'right' },
      { head: 'limit', unit: '% of U1', align: 'decimal', grow: 1 },
      ...cases.map((item) => ({ head: item.name, unit: '% of U1', align: 'decimal' as const, grow: 1 })),
      { head: 'without correction, worst case', unit: '% of U1', align: 'decimal', grow: 1 },
      { head: 'over all cases', align: 'left', grow: 1 },
    ],
    rows,
    notes: [
      ...(named === '' ? [] : [`Limits: ${named}${orders.informs ? '; here they only inform' : ''}.`]),
      ...provenanceNote(sources),
    ],
  };
}

function busBlocks(view: SheetView, bus: Bus): Block[] {
  const orders = ordersOf(view, bus);
  const heading: Block = {
    kind: 'heading',
    text: nameOf(bus),
    aside: bus.pcc ? 'point of common coupling' : 'inside the site',
  };
  if (orders.cases.length === 0) {
    return [
      heading,
      { kind: 'paragraph', text: 'No figures: the busbar has no source, or no case was solved.' },
    ];
  }
  const present = presentOrders(orders);
  if (present.length === 0) {
    const text = `Every order stays below ${fixed(SHOWN_FROM_PERCENT, 2)} % in every case.`;
    return [heading, { kind: 'paragraph', text }];
  }
  const blocks: Block[] = [heading];
  for (let first = 0; first < orders.cases.length; first += CASES_PER_TABLE) {
    blocks.push(tableOf(view, orders, orders.cases.slice(first, first + CASES_PER_TABLE), present));
  }
  return blocks;
}

/** Harmonic voltages of every busbar by order and case beside the limits that judge it. */
export function harmonicsSection(view: SheetView): Section {
  return {
    id: 'harmonics',
    title: 'Harmonic voltages against limits',
    aside: 'worst phase, as judged',
    blocks: [
      {
        kind: 'paragraph',
        small: true,
        leadsOn: true,
        text: `Orders below ${fixed(SHOWN_FROM_PERCENT, 2)} % in every case, with the correction and without, are left out. Groups of sources of unknown mutual phase are added by magnitude, or by the summation law where the study chooses it.`,
      },
      ...view.study.buses.flatMap((bus) => busBlocks(view, bus)),
    ],
  };
}
