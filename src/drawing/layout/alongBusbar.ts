import type { SeriesElement, ShuntElement, StudyElement } from '../../study/index.ts';
import { isSource, type SiteGraph } from './siteGraph.ts';
import type { Storeys } from './storeys.ts';

/**
 * What stands along a busbar, left to right.
 *  leaf:   a part that hangs and leads nowhere.
 *  lead:   parallel parts leading down to a busbar drawn below this one.
 *  column: a part leading down and over to a busbar drawn elsewhere (a ring, a second infeed).
 */
export type Slot =
  | { kind: 'leaf'; part: ShuntElement }
  | { kind: 'lead'; parts: SeriesElement[]; below: number }
  | { kind: 'column'; part: SeriesElement; to: number };

/** A tie drawn straight from the right end of one bar to the left end of the next. */
export interface EndTie {
  part: SeriesElement;
  left: number;
  right: number;
}

export interface Arrangement {
  slots: Slot[][];
  /** Sources drawn above their busbar. */
  feeds: ShuntElement[][];
  /** Busbars attached at the right end in the same storey, left to right. */
  beside: number[][];
  ties: EndTie[];
  /** Columns arriving from above, and from below (same storey), at each busbar. */
  fromAbove: SeriesElement[][];
  fromBelow: SeriesElement[][];
}

/** All parts touching each busbar in drawing order: that of the study's view, else of the file. */
export function orderAlong(graph: SiteGraph): StudyElement[][] {
  const fileOrder = new Map(graph.study.elements.map((part, index) => [part.id, index]));
  return graph.study.buses.map((_, bus) => partsAlong(graph, bus, fileOrder));
}

/** Puts every part in its slot. */
export function arrange(graph: SiteGraph, storeys: Storeys, order = orderAlong(graph)): Arrangement {
  const buses = graph.study.buses;
  const list = <T>() => buses.map((): T[] => []);
  const result: Arrangement = {
    slots: list<Slot>(),
    feeds: list<ShuntElement>(),
    beside: list<number>(),
    ties: [],
    fromAbove: list<SeriesElement>(),
    fromBelow: list<SeriesElement>(),
  };
  storeys.beside.forEach((left, bus) => {
    if (left >= 0) result.beside[left]?.push(bus);
  });
  result.ties = endTies(graph, storeys, result, order);
  const tied = new Set<SeriesElement>(result.ties.map((tie) => tie.part));
  const sequence = drawnSequence(graph, storeys, result, order).position;
  buses.forEach((_, bus) => {
    fillSlots(graph, storeys, bus, order[bus] ?? [], tied, sequence, result);
  });
  return result;
}

/** The order list of the view may be partial or stale. */
function partsAlong(graph: SiteGraph, bus: number, fileOrder: ReadonlyMap<string, number>): StudyElement[] {
  const touching = [...(graph.hanging[bus] ?? []), ...(graph.joins[bus] ?? []).map((join) => join.part)];
  const order = graph.study.view?.orderAlong?.[graph.study.buses[bus]?.id ?? ''] ?? [];
  const wished = new Map(order.map((id, index) => [id, index]));
  const rank = (part: StudyElement) => wished.get(part.id) ?? order.length + (fileOrder.get(part.id) ?? 0);
  return touching.sort((a, b) => rank(a) - rank(b));
}

export function otherEnd(graph: SiteGraph, bus: number, part: StudyElement): number {
  return graph.joins[bus]?.find((join) => join.part === part)?.other ?? -1;
}

/**
 * Busbars and passing columns of every storey from left to right, as the packing will place them. Two
 * busbars next to each other here can be tied end to end.
 */
function drawnSequence(graph: SiteGraph, storeys: Storeys, into: Arrangement, order: StudyElement[][]) {
  const rows: number[][] = [];
  const position = new Map<number, number>();
  const put = (storey: number, bus: number) => {
    rows[storey] ??= [];
    rows[storey]?.push(bus);
  };
  const visit = (bus: number) => {
    const storey = storeys.storey[bus] ?? 0;
    position.set(bus, position.size);
    put(storey, bus);
    const seen = new Set<number>();
    for (const part of order[bus] ?? []) {
      const other = otherEnd(graph, bus, part);
      if (other < 0 || seen.has(other)) continue;
      for (let between = storey + 1; between < (storeys.storey[other] ?? 0); between++) put(between, -1);
      if (storeys.above[other] === bus) {
        seen.add(other);
        visit(other);
      }
    }
    for (const right of into.beside[bus] ?? []) visit(right);
  };
  for (const tops of storeys.tops) {
    for (const top of tops) visit(top);
    for (const row of rows) row.push(-1);
  }
  return { rows, position };
}

function endTies(graph: SiteGraph, storeys: Storeys, into: Arrangement, order: StudyElement[][]): EndTie[] {
  const ties: EndTie[] = [];
  for (const row of drawnSequence(graph, storeys, into, order).rows) {
    row.forEach((left, at) => {
      const right = row[at + 1] ?? -1;
      if (left < 0 || right < 0) return;
      const between = (graph.joins[left] ?? []).filter((join) => join.other === right);
      const chosen = between.find((join) => join.part.kind === 'coupler') ?? between[0];
      if (chosen) ties.push({ part: chosen.part, left, right });
    });
  }
  return ties;
}

function fillSlots(
  graph: SiteGraph,
  storeys: Storeys,
  bus: number,
  parts: StudyElement[],
  tied: Set<StudyElement>,
  sequence: Map<number, number>,
  into: Arrangement,
): void {
  const slots = into.slots[bus] ?? [];
  const storey = storeys.storey[bus] ?? 0;
  for (const part of parts) {
    if (tied.has(part)) continue;
    if (!('from' in part)) {
      if (storey === 0 && isSource(part)) into.feeds[bus]?.push(part);
      else slots.push({ kind: 'leaf', part });
      continue;
    }
    const other = otherEnd(graph, bus, part);
    const otherStorey = storeys.storey[other] ?? 0;
    if (otherStorey < storey) continue;
    if (otherStorey === storey) {
      // The left busbar carries the part; it comes up again under the right one.
      if ((sequence.get(bus) ?? 0) > (sequence.get(other) ?? 0)) continue;
      slots.push({ kind: 'column', part, to: other });
      into.fromBelow[other]?.push(part);
    } else if (storeys.above[other] === bus) {
      const lead = slots.find((slot) => slot.kind === 'lead' && slot.below === other);
      if (lead?.kind === 'lead') lead.parts.push(part);
      else slots.push({ kind: 'lead', parts: [part], below: other });
    } else {
      slots.push({ kind: 'column', part, to: other });
      into.fromAbove[other]?.push(part);
    }
  }
}

/** Parts leading on from busbars that have hanging parts as well. */
export function leadsAmongLeaves(arrangement: Arrangement): Set<StudyElement> {
  const found = new Set<StudyElement>();
  for (const slots of arrangement.slots) {
    if (!slots.some(({ kind }) => kind === 'leaf')) continue;
    for (const slot of slots) {
      if (slot.kind === 'column') found.add(slot.part);
      if (slot.kind === 'lead') for (const part of slot.parts) found.add(part);
    }
  }
  return found;
}
