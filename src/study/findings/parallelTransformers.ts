import { isOn, isSeries } from '../lookup.ts';
import { fullNameOf } from '../names.ts';
import type { Study, Transformer } from '../types.ts';
import { formatNumber, formatQuantity } from '../units/formatQuantity.ts';
import { parseVectorGroup } from '../vectorGroup.ts';
import { type Said, type State, saidOfPart, setFields } from './Said.ts';

/** Ratios of parallel transformers may differ by so much: the tolerance of IEC 60076-1, from memory. */
const ratioSlack = 0.005;
/** Impedance voltages in parallel within a tenth of their mean: common practice. */
const ukSlack = 0.1;
/** Rated powers in parallel up to 3 : 1: common practice. */
const ratingSpan = 3;

/** Transformers whose shifts meet in a loop, and parallel pairs that share their load badly. */
export function parallelFindings(state: State): Said[] {
  return [...shiftFindings(state.here), ...pairFindings(state)];
}

interface Joined {
  transformer: Transformer;
  /** Groups of busbars joined without a transformer. */
  hv: string;
  lv: string;
  clock: number;
}

/** The busbar standing for all that are joined to it by parts in service of which `joins` is true. */
function groupsOf(study: Study, joins: (kind: string) => boolean): (bus: string) => string {
  const leader = new Map<string, string>();
  const find = (bus: string): string => {
    let at = bus;
    for (let next = leader.get(at); next !== undefined; next = leader.get(at)) at = next;
    return at;
  };
  for (const part of study.elements) {
    if (!isSeries(part) || !isOn(part) || !joins(part.kind)) continue;
    const [a, b] = [find(part.from), find(part.to)];
    if (a !== b) leader.set(b, a);
  }
  return find;
}

function joinedTransformers(study: Study, group: (bus: string) => string): Joined[] {
  return study.elements.flatMap((part): Joined[] => {
    if (part.kind !== 'transformer' || !isOn(part)) return [];
    const vector = parseVectorGroup(part.vectorGroup);
    if (typeof vector === 'string') return [];
    return [{ transformer: part, hv: group(part.from), lv: group(part.to), clock: vector.clock }];
  });
}

/**
 * Round every loop the shifts must cancel. Each group of busbars gets the shift at which it is first
 * reached; a transformer that would give it another one closes a loop in which a large current circulates.
 */
function shiftFindings(study: Study): Said[] {
  const joined = joinedTransformers(
    study,
    groupsOf(study, (kind) => kind !== 'transformer'),
  );
  const shift = new Map<string, { hours: number; by: Joined | null }>();
  const at = new Map<string, Joined[]>();
  for (const one of joined) for (const end of [one.hv, one.lv]) at.set(end, [...(at.get(end) ?? []), one]);
  const said: Said[] = [];
  const told = new Set<Joined>();
  for (const start of joined.map(({ hv }) => hv)) {
    if (shift.has(start)) continue;
    shift.set(start, { hours: 0, by: null });
    const reached = [start];
    for (const group of reached) {
      const here = shift.get(group);
      if (!here) continue;
      for (const one of at.get(group) ?? []) {
        const [other, hours] =
          one.hv === group ? [one.lv, here.hours + one.clock] : [one.hv, here.hours - one.clock];
        const standing = shift.get(other);
        if (!standing) {
          shift.set(other, { hours, by: one });
          reached.push(other);
        } else if ((standing.hours - hours) % 12 !== 0 && !told.has(one)) {
          told.add(one);
          said.push(wrongShift(one, standing.by ?? here.by, standing.hours - hours));
        }
      }
    }
  }
  return said;
}

function wrongShift({ transformer }: Joined, by: Joined | null, hours: number): Said {
  const apart = Math.abs((((hours % 12) + 18) % 12) - 6) * 30;
  const other = by
    ? ` with ${fullNameOf(by.transformer)} (${by.transformer.vectorGroup})`
    : ' with another path';
  return saidOfPart(transformer, 'vectorGroup', {
    code: 'phase-shift',
    severity: 'error',
    text: `${transformer.vectorGroup} lies in parallel${other}; the clock numbers leave the two voltages ${apart}° apart, and a current like that of a fault circulates; allowed is 0°`,
    mend: 'read both vector groups from the nameplates; if they stand, never close them in parallel: open one of them or the coupler between',
  });
}

/** Pairs between the same busbars, couplers counted as busbars. */
function pairFindings(state: State): Said[] {
  const joined = joinedTransformers(
    state.here,
    groupsOf(state.here, (kind) => kind === 'coupler'),
  );
  return joined.flatMap((second, index) => {
    const first = joined.slice(0, index).find(({ hv, lv }) => hv === second.hv && lv === second.lv);
    return first && first.clock === second.clock
      ? [
          ...ratioFinding(state, first.transformer, second.transformer),
          ...shareFindings(first.transformer, second.transformer),
        ]
      : [];
  });
}

const ratioOf = (part: Transformer): number => (part.hvV * (1 + (part.tapPercent ?? 0) / 100)) / part.lvV;

/** Circulating current at no load as a share of the second's rated current: ΔU/(z1 + z2) on its rating. */
function circulatingShare(first: Transformer, second: Transformer): number {
  const apart = Math.abs(ratioOf(first) / ratioOf(second) - 1);
  const z = (second.ukPercent + (first.ukPercent * second.ratedKVA) / first.ratedKVA) / 100;
  return apart / z;
}

function ratioFinding(state: State, first: Transformer, second: Transformer): Said[] {
  const apart = Math.abs(ratioOf(first) / ratioOf(second) - 1);
  if (apart <= ratioSlack) return [];
  const sameRated = Math.abs(first.hvV / first.lvV / (second.hvV / second.lvV) - 1) <= ratioSlack;
  const tap = first.tapPercent ?? 0;
  const words = `set the tap of ${fullNameOf(second)} to ${formatQuantity(tap, '%')}`;
  return [
    saidOfPart(second, sameRated ? 'tapPercent' : 'hvV', {
      code: 'parallel-ratio',
      severity: 'warning',
      text: `the ratio ${formatNumber(ratioOf(second))} lies ${percent(apart)} from the ${formatNumber(ratioOf(first))} of ${fullNameOf(first)} in parallel; about ${percent(circulatingShare(first, second))} of its rated current circulates at no load; allowed are 0.5 %`,
      mend: sameRated ? words : 'give both the same ratio, or open one of them',
      repair: sameRated
        ? setFields(state, second.id, { tapPercent: tap === 0 ? undefined : tap }, words)
        : undefined,
    }),
  ];
}

function shareFindings(first: Transformer, second: Transformer): Said[] {
  const said: Said[] = [];
  const mean = (first.ukPercent + second.ukPercent) / 2;
  const apart = Math.abs(first.ukPercent - second.ukPercent) / mean;
  if (apart > ukSlack) {
    const low = first.ukPercent < second.ukPercent ? first : second;
    said.push(
      saidOfPart(second, 'ukPercent', {
        code: 'parallel-uk',
        severity: 'warning',
        text: `uk ${formatQuantity(second.ukPercent, '%')} beside ${formatQuantity(first.ukPercent, '%')} of ${fullNameOf(first)} in parallel, ${percent(apart)} apart; ${fullNameOf(low)} takes more than its share and is full first; common practice allows 10 %`,
        mend: 'check both nameplates; if they stand, keep the sum of the load below what the one with the lower uk allows',
      }),
    );
  }
  const span = Math.max(first.ratedKVA, second.ratedKVA) / Math.min(first.ratedKVA, second.ratedKVA);
  if (span > ratingSpan) {
    said.push(
      saidOfPart(second, 'ratedKVA', {
        code: 'parallel-rating',
        severity: 'note',
        text: `${formatQuantity(second.ratedKVA, 'kVA')} lies in parallel with ${formatQuantity(first.ratedKVA, 'kVA')}, ${formatNumber(span, { digits: 2 })} : 1; common practice keeps to 3 : 1`,
        mend: 'check that both carry their share; the angles of their impedances differ',
      }),
    );
  }
  return said;
}

function percent(share: number): string {
  return formatQuantity(100 * share, '%', { digits: 2 });
}
