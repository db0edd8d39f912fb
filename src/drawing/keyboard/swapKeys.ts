import { type ElementKind, elementById, replaceObstacle } from '../../study/index.ts';
import { planReplace } from '../gestures/planNew.ts';
import { readSubject } from '../subject.ts';
import type { Key, KeyContext, Swap } from './KeyContext.ts';
import { kindOfKey } from './kindKeys.ts';
import type { Direction } from './neighbour.ts';

/** Kinds that often take each other's place. */
const families: readonly (readonly ElementKind[])[] = [
  ['motor', 'converter', 'load'],
  ['bank', 'filter', 'shunt'],
  ['supply', 'generator'],
  ['cable', 'reactor', 'branch', 'coupler', 'transformer'],
];

/** The kinds that could take a part's place, the likeliest first. */
function kindsFor(c: KeyContext, id: string): ElementKind[] {
  const own = elementById(c.study, id)?.kind;
  const nearest = families.find((family) => own && family.includes(own)) ?? [];
  const likely = [...new Set([...nearest, ...families.flat()])];
  return likely.filter((kind) => replaceObstacle(c.study, id, kind) === null);
}

/** Begins to look for the kind that takes the focused part's place. */
export function beginSwap(c: KeyContext): boolean {
  const read = c.current ? readSubject(c.current) : undefined;
  const part = read?.kind === 'element' ? elementById(c.study, read.id) : undefined;
  const kind = part && kindsFor(c, part.id)[0];
  if (!part || !kind) return false;
  c.onOpenSlip(null);
  c.setSwap({ id: part.id, kind });
  return true;
}

/** Keys while a part waits: arrows go through the kinds, a kind's letter or Enter takes it, Escape leaves. */
export function swapKeys(c: KeyContext, swap: Swap, key: Key, direction: Direction | undefined): boolean {
  const kinds = kindsFor(c, swap.id);
  if (direction) {
    const step = direction === 'right' || direction === 'down' ? 1 : -1;
    const next = kinds.at((kinds.indexOf(swap.kind) + step) % kinds.length);
    if (next) c.setSwap({ ...swap, kind: next });
    return true;
  }
  const wanted = key.key === 'Enter' ? swap.kind : kindOfKey(key);
  if (wanted === undefined && key.key !== 'Escape') return false;
  const plan = wanted && wanted !== 'bus' ? planReplace(c.study, swap.id, wanted) : undefined;
  if (plan?.refused) {
    c.onSay(plan.words);
    return true;
  }
  c.setSwap(null);
  if (plan?.edit) c.onDrop(plan.edit, plan.select);
  return true;
}
