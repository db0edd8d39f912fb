import { type RefObject, useEffect, useMemo, useRef, useState } from 'react';
import { type Chosen, type Edit, type Study, withBelow } from '../../study/index.ts';
import type { DropOutcome } from '../gestures/DropOutcome.ts';
import { dropPlan } from '../gestures/dropPlan.ts';
import type { Held } from '../gestures/Held.ts';
import { planReplace } from '../gestures/planNew.ts';
import { isSeriesKind, type TrayKind } from '../gestures/TrayKind.ts';
import { useGestures } from '../gestures/useGestures.ts';
import type { Layout } from '../layout/index.ts';
import { readSubject, type Subject } from '../subject.ts';
import type { PaneControls } from '../view/usePaneView.ts';
import { busInFocus, OFF_PAPER } from './carryKeys.ts';
import type { Key, Swap } from './KeyContext.ts';
import { useDrawingKeys } from './useDrawingKeys.ts';
import { useKeyboardInput } from './useKeyboardInput.ts';
import { useLooseKeys } from './useLooseKeys.ts';

export interface HandlingProps {
  study: Study;
  focusBus: string;
  selection: readonly Subject[];
  openSlip: Subject | null;
  armedKind: TrayKind | null;
  onSelect(items: readonly Subject[]): void;
  onFocusBus(bus: string): void;
  onOpenSlip(subject: Subject | null): void;
  onEdit(edit: Edit): void;
  onRemove(chosen: Chosen): void;
  onSay(words: string): void;
  onArm(kind: TrayKind | null): void;
}

/** Pointer and keyboard on the drawing: what is in the hand, what letting go would do, and the doing of it. */
export function useHandling(
  paneRef: RefObject<HTMLElement | null>,
  props: HandlingProps,
  layout: Layout,
  controls: PaneControls,
  [current, setCurrent]: [Subject | undefined, (subject: Subject) => void],
) {
  const { study, selection, armedKind } = props;
  const [moved, setMoved] = useState<Held | null>(null);
  const [swap, setSwap] = useState<Swap | null>(null);
  const [aimed, setAimed] = useState<string | undefined>();
  // A kind taken by the pointer lights nothing until the pointer, or a key, says where.
  const [pointed, setPointed] = useState(false);
  const byKey = useKeyboardInput();
  // The armed kind is in the hand from the very press that armed it.
  const carried: Held | null = armedKind ? { what: 'new', kind: armedKind } : moved;
  const stands = (id: string | undefined) => layout.buses.some((bus) => bus.id === id);
  const target = [aimed, props.focusBus, layout.buses[0]?.id].find(stands);

  const onDrop = (edit: Edit, select: readonly Subject[] | undefined) => {
    props.onEdit(edit);
    if (!select) return;
    props.onSelect(select);
    const last = select.at(-1);
    if (last) setCurrent(last);
  };
  const onPress = (subject: Subject | undefined, adding: boolean) => {
    setSwap(null);
    if (moved) return letGoAt(subject);
    if (!subject) {
      if (adding) return;
      props.onSelect([]);
      props.onOpenSlip(null);
      return;
    }
    setCurrent(subject);
    if (adding) {
      const without = selection.filter((item) => item !== subject);
      props.onSelect(without.length < selection.length ? without : [...selection, subject]);
      return;
    }
    const again = selection.length === 1 && selection[0] === subject;
    props.onSelect([subject]);
    const read = readSubject(subject);
    if (read?.kind === 'bus') props.onFocusBus(read.id);
    if (again) props.onOpenSlip(subject);
    else if (props.openSlip !== null && props.openSlip !== subject) props.onOpenSlip(null);
  };
  /** A click on a busbar is where the keyboard's find goes; anywhere else it stays. */
  const letGoAt = (subject: Subject | undefined) => {
    const bus = subject ? readSubject(subject) : undefined;
    const plan = moved && bus?.kind === 'bus' ? dropPlan(study, layout, moved, { bus: bus.id }) : undefined;
    setMoved(null);
    if (plan?.edit) onDrop(plan.edit, plan.select);
    else if (plan?.refused) props.onSay(plan.words);
  };
  const onBand = (picks: readonly Subject[]) => {
    props.onSelect([...new Set([...selection, ...picks])]);
  };
  const { hand, band, handlers } = useGestures(paneRef, {
    ...{ study, layout, controls, selection, armedKind },
    ...{ onArm: props.onArm, onDrop, onPress, onBand },
  });
  const actOnKey = useDrawingKeys({
    ...props,
    ...{ layout, controls, current, carried, swap, targetBus: target },
    ...{ setCurrent, setCarried: setMoved, setSwap, setTarget: setAimed, onDrop },
  });
  const act = (key: Key): boolean => {
    if (!pointed || armedKind === null || key.key === 'Escape') return actOnKey(key);
    setPointed(false);
    return key.key === 'Enter' || actOnKey(key);
  };
  useLooseKeys(paneRef, act);

  const latestFocus = useRef<string | undefined>(undefined);
  latestFocus.current = selection.length > 0 ? busInFocus({ layout, current }) : undefined;
  useEffect(() => {
    if (!armedKind) return;
    setMoved(null);
    setSwap(null);
    setPointed(!byKey.current);
    setAimed(latestFocus.current);
    paneRef.current?.focus({ preventScroll: true });
  }, [armedKind, paneRef, byKey]);

  const looking = carried !== null && !(armedKind !== null && pointed);
  const keyPlan = useMemo(
    () => keyedPlan(study, layout, looking ? carried : null, swap, target),
    [study, layout, looking, carried, swap, target],
  );
  const inHand = hand?.held ?? (looking ? carried : null);
  const held = useMemo(() => heldIds(study, inHand), [study, inHand]);
  const plan: DropOutcome | undefined = hand?.plan ?? keyPlan;
  return {
    hand,
    band,
    handlers,
    act,
    plan,
    keyPlan,
    held,
    keyHints: keyHints(looking ? carried : null, swap),
  };
}

function keyedPlan(
  study: Study,
  layout: Layout,
  carried: Held | null,
  swap: Swap | null,
  target: string | undefined,
): DropOutcome | undefined {
  if (swap) return planReplace(study, swap.id, swap.kind);
  return carried ? dropPlan(study, layout, carried, target ? { bus: target } : OFF_PAPER) : undefined;
}

/** Everything that moves with what is in the hand. */
function heldIds(study: Study, held: Held | null): ReadonlySet<string> {
  if (held?.what !== 'parts') return new Set();
  const { elements, buses } = withBelow(study, held.ids);
  return new Set([...[...elements].map((id) => `element:${id}`), ...[...buses].map((id) => `bus:${id}`)]);
}

/** What the keys do meanwhile, for the eye. */
function keyHints(carried: Held | null, swap: Swap | null): readonly [key: string, words: string][] {
  if (swap)
    return [
      ['← →', 'another kind'],
      ['its letter', 'at once'],
      ['Enter', 'replace'],
      ['Escape', 'leave'],
    ];
  if (!carried) return [];
  const choose = ['← ↑ ↓ →', 'choose the busbar'] as const;
  const lower = carried.what === 'new' && isSeriesKind(carried.kind) && carried.upper === undefined;
  return [
    [...choose],
    ['Enter', carried.what === 'new' && !lower && carried.upper === undefined ? 'hang it' : 'let go'],
    ...(lower ? [['Shift+Enter', 'choose its lower busbar, too'] as [string, string]] : []),
    ['Escape', 'leave'],
  ];
}
