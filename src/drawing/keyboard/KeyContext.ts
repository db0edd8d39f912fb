import type { Chosen, Edit, ElementKind, Study } from '../../study/index.ts';
import type { Held } from '../gestures/Held.ts';
import type { TrayKind } from '../gestures/TrayKind.ts';
import type { Layout } from '../layout/index.ts';
import type { Subject } from '../subject.ts';
import type { PaneControls } from '../view/usePaneView.ts';

/** A part that waits for the kind that takes its place. */
export interface Swap {
  id: string;
  kind: ElementKind;
}

/** What the keys of the drawing act on. */
export interface KeyContext {
  study: Study;
  layout: Layout;
  controls: PaneControls;
  selection: readonly Subject[];
  current: Subject | undefined;
  openSlip: Subject | null;
  /** What looks for a busbar: a new part, parts being moved, or an end. */
  carried: Held | null;
  armedKind: TrayKind | null;
  targetBus: string | undefined;
  swap: Swap | null;
  setCurrent(subject: Subject): void;
  setCarried(held: Held | null): void;
  setTarget(bus: string | undefined): void;
  setSwap(swap: Swap | null): void;
  onArm(kind: TrayKind | null): void;
  onSelect(items: readonly Subject[]): void;
  onFocusBus(bus: string): void;
  onOpenSlip(subject: Subject | null): void;
  onDrop(edit: Edit, select: readonly Subject[] | undefined): void;
  onRemove(chosen: Chosen): void;
  onSay(words: string): void;
}

/** As much of a keyboard event as the keys need, from React or from the window. */
export type Key = Pick<
  KeyboardEvent,
  'key' | 'code' | 'altKey' | 'ctrlKey' | 'metaKey' | 'shiftKey' | 'preventDefault' | 'stopPropagation'
>;
