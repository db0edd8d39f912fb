import { trayNames } from '../gestures/TrayKind.ts';
import { trayEntries } from '../tray/trayEntries.ts';
import { kindKeys } from './kindKeys.ts';

/** Every key of the drawing with what it does, for the map of keys. */
export const drawingKeys: readonly (readonly [keys: string, words: string])[] = [
  ['←  →  ↑  ↓', 'move along parts and busbars'],
  ['Enter', 'open the data of the part; in its data: take the value and go on'],
  ['Space', 'select; on a busbar, move the rail there'],
  ['Shift+←  →', 'select further parts'],
  ['Shift+Space', 'add to the selection, or take out of it'],
  ['Mod+A', 'select everything'],
  ['H', 'hang it elsewhere, with all below: arrows choose the busbar, Enter lets go'],
  ['J', 'join its lower end to another busbar; Shift+J its upper end'],
  ['W', 'swap it for another kind, keeping name and place'],
  ['Alt+←  →', 'move it along its busbar'],
  ['Mod+C  X  V', 'copy, cut, paste onto the busbar, in any window or study'],
  ['Mod+D', 'duplicate beside it; series parts in parallel'],
  ['Delete', 'remove what is selected, with all that hangs below'],
  ['0  +  −', 'fit, enlarge, reduce'],
  ['Escape', 'close, or give the gesture up'],
];

/** The letters that add a part to the busbar in focus. */
export const trayKeys: readonly (readonly [keys: string, words: string])[] = [
  ...trayEntries.flatMap(({ kinds }) => kinds.map((kind) => [kindKeys[kind], trayNames[kind]] as const)),
  ['Shift+T C R O E', 'the same between this busbar and another one that stands'],
  ['Enter', 'in the tray: take the part; arrows choose the busbar, Enter lets go'],
];
