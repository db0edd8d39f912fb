import { formatNumber, nameOf, type Study } from '../../study/index.ts';
import { nameplateChecks } from '../judgedOnce.ts';
import type { Verdict, VerdictWord } from '../types.ts';
import {
  type QuantityGroup,
  type StateNumbers,
  type StateQuantity,
  stateQuantities,
} from './stateQuantities.ts';

/** One side of a compared row. */
export interface ComparedValue {
  /** As printed, without unit; "–" where the state does not have it. */
  text: string;
  value: number | null;
  /** Of a verdict: its word, and its margin as printed. */
  word?: VerdictWord;
  margin?: string;
}

export interface ComparedRow {
  key: string;
  group: QuantityGroup | 'verdict';
  subject: Verdict['subject'];
  title: string;
  unit: string;
  a: ComparedValue;
  b: ComparedValue;
  /** b − a as printed with its sign; '' where one side is missing or both read the same. */
  difference: string;
  /** Size of the change for sorting: 0 where both read the same, 1 for all of it, more for another verdict. */
  change: number;
}

const absent: ComparedValue = { text: '–', value: null };

/**
 * Two states of one study, number by number and verdict by verdict, in reading order. Verdicts that pass in
 * both are left out. Rows differ where they read differently, not where the last bit does.
 */
export function compareStates(study: Study, a: StateNumbers, b: StateNumbers): ComparedRow[] {
  return [...quantityRows(a, b), ...verdictRows(study, a.verdicts, b.verdicts)];
}

/** How many checks pass in both states and stand in no row. */
export function passingInBoth(a: readonly Verdict[], b: readonly Verdict[]): number {
  const passing = new Set(a.filter(({ verdict }) => verdict === 'pass').map(({ key }) => key));
  return b.filter(({ verdict, key }) => verdict === 'pass' && passing.has(key)).length;
}

/** Keys of both lists, each new one after its neighbour before it. */
function mergedKeys(first: readonly string[], second: readonly string[]): string[] {
  const merged = [...first];
  const known = new Set(first);
  second.forEach((key, at) => {
    if (known.has(key)) return;
    const before = second[at - 1];
    merged.splice(before === undefined ? 0 : merged.indexOf(before) + 1, 0, key);
    known.add(key);
  });
  return merged;
}

function quantityRows(a: StateNumbers, b: StateNumbers): ComparedRow[] {
  const [left, right] = [stateQuantities(a), stateQuantities(b)];
  const byKey = (list: readonly StateQuantity[]) => new Map(list.map((one) => [one.key, one]));
  const [inA, inB] = [byKey(left), byKey(right)];
  return mergedKeys(
    left.map(({ key }) => key),
    right.map(({ key }) => key),
  ).flatMap((key) => {
    const [one, other] = [inA.get(key), inB.get(key)];
    const told = one ?? other;
    return told ? [quantityRow(told, one, other)] : [];
  });
}

function printed({ value, decimals }: Pick<StateQuantity, 'value' | 'decimals'>): string {
  return formatNumber(value, decimals === undefined ? { digits: 4 } : { decimals });
}

function quantityRow(told: StateQuantity, one?: StateQuantity, other?: StateQuantity): ComparedRow {
  const a = one ? { text: printed(one), value: one.value } : absent;
  const b = other ? { text: printed(other), value: other.value } : absent;
  const { key, group, subject, title, unit, decimals } = told;
  return {
    key,
    group,
    subject,
    title,
    unit,
    a,
    b,
    difference: difference(a, b, decimals),
    change: a.text === b.text ? 0 : relativeChange(a.value, b.value),
  };
}

function difference(a: ComparedValue, b: ComparedValue, decimals?: number): string {
  if (a.value === null || b.value === null || a.text === b.text) return '';
  const by = b.value - a.value;
  const text = formatNumber(by, decimals === undefined ? { digits: 3 } : { decimals });
  return by > 0 ? `+${text}` : text;
}

function relativeChange(a: number | null, b: number | null): number {
  if (a === null || b === null) return 1;
  const size = Math.max(Math.abs(a), Math.abs(b));
  return size === 0 ? 0 : Math.min(1, Math.abs(b - a) / size);
}

const gravity: Record<VerdictWord, number> = { pass: 0, unknown: 1, watch: 2, fail: 3 };

function verdictRows(study: Study, left: readonly Verdict[], right: readonly Verdict[]): ComparedRow[] {
  const [inA, inB] = [left, right].map((list) => new Map(list.map((one) => [one.key, one])));
  const keys = mergedKeys(
    left.map(({ key }) => key),
    right.map(({ key }) => key),
  );
  return keys.flatMap((key) => {
    const [one, other] = [inA?.get(key), inB?.get(key)];
    const told = one ?? other;
    if (!told || [one, other].every((verdict) => !verdict || verdict.verdict === 'pass')) return [];
    // What is asked for once, in the first case, is no difference of the other.
    if (!(one && other) && (told.verdict === 'unknown' || nameplateChecks.has(told.check))) return [];
    return [verdictRow(study, told, one, other)];
  });
}

function verdictValue(verdict: Verdict | undefined): ComparedValue {
  if (!verdict) return absent;
  const { value, margin, verdict: word } = verdict;
  return {
    text: value === null ? '–' : formatNumber(value, { digits: 3 }),
    value: margin,
    word,
    margin: margin === null ? '' : `${margin > 0 ? '+' : ''}${formatNumber(margin, { decimals: 2 })}`,
  };
}

function verdictRow(study: Study, told: Verdict, one?: Verdict, other?: Verdict): ComparedRow {
  const [a, b] = [verdictValue(one), verdictValue(other)];
  const list = told.subject.kind === 'bus' ? study.buses : study.elements;
  const subject = (list as readonly { id: string; name?: string }[]).find(({ id }) => id === told.subject.id);
  const same = a.text === b.text && a.word === b.word && a.margin === b.margin;
  // An order that is not listed on one side is none that counts there.
  const turned = Math.abs(gravity[a.word ?? 'pass'] - gravity[b.word ?? 'pass']);
  const [ma, mb] = [a.value ?? 0, b.value ?? 0];
  return {
    key: told.key,
    group: 'verdict',
    subject: told.subject,
    title: `${subject ? nameOf(subject) : told.subject.id} · ${told.title}`,
    unit: told.unit,
    a,
    b,
    difference: same ? '' : difference(a, b, 2),
    change: same ? 0 : turned + Math.min(1, Math.abs(mb - ma)),
  };
}

/** The rows as tab-separated text with a head, for a spreadsheet. */
export function comparedText(rows: readonly ComparedRow[], nameA: string, nameB: string): string {
  const side = ({ text, word, margin }: ComparedValue): string[] => [text, word ?? '', margin ?? ''];
  const head = ['quantity', 'unit', nameA, 'verdict', 'margin', nameB, 'verdict', 'margin', 'change'];
  const lines = rows.map(({ title, unit, a, b, difference: by }) => [
    title,
    unit,
    ...side(a),
    ...side(b),
    by,
  ]);
  return [head, ...lines].map((cells) => cells.map(plain).join('\t')).join('\n');
}

/** Thin spaces and the true minus are for reading; a spreadsheet takes neither for a number. */
function plain(cell: string): string {
  return cell.replaceAll('\u2009', '').replaceAll('\u2212', '-').replaceAll('–', '').replaceAll('\t', ' ');
}
