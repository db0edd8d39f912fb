/** One thing that can be done with a note: run at once, or a choice of further ones. */
export interface NoteAction {
  id: string;
  words: string;
  /** As the key map writes them. */
  keys?: string;
  run?(): void;
  choices?: readonly NoteAction[];
}

/** Actions in groups, as a menu shows them between its rules. */
export type NoteActions = readonly (readonly NoteAction[])[];

/** The pictures of a reading, each on its own. */
export type ReadingPicture = 'phasors' | 'waveform' | 'spectrum';

/** Where a picture, or its numbers, go. */
export type PictureWay = 'copySvg' | 'copyPng' | 'saveSvg' | 'savePng' | 'copyValues';

export const PICTURE_WAYS: readonly { way: PictureWay; words: string }[] = [
  { way: 'copySvg', words: 'Copy as SVG' },
  { way: 'copyPng', words: 'Copy as PNG' },
  { way: 'saveSvg', words: 'Save as SVG…' },
  { way: 'savePng', words: 'Save as PNG…' },
  { way: 'copyValues', words: 'Copy the values as a table' },
];

const PICTURE_WORDS: Record<ReadingPicture, string> = {
  phasors: 'Phasors',
  waveform: 'Waveform',
  spectrum: 'Spectrum',
};

interface ReadingDoings {
  lens: boolean;
  folded: boolean;
  /** What the card does not show now. */
  otherFace: 'course' | 'spectrum';
  first: boolean;
  last: boolean;
  onFold(): void;
  onWiden(): void;
  onFace(): void;
  onMove: ((by: -1 | 1) => void) | undefined;
  onUnpin: (() => void) | undefined;
  onCopy(): void;
  onPicture: ((picture: ReadingPicture, way: PictureWay) => void) | undefined;
}

/** What can be done with a reading. */
export function readingActions(doings: ReadingDoings): NoteActions {
  const { lens, folded, onMove, onUnpin, onPicture } = doings;
  const face = doings.otherFace === 'spectrum' ? 'Show the spectrum' : 'Show phasors and waveform';
  return [
    [
      { id: 'fold', words: folded ? 'Unfold' : 'Fold to one line', keys: 'Enter', run: doings.onFold },
      {
        id: 'widen',
        words: lens ? 'Narrow to the column' : 'Widen to a lens',
        keys: 'L',
        run: doings.onWiden,
      },
      ...(lens || folded ? [] : [{ id: 'face', words: face, keys: 'S', run: doings.onFace }]),
    ],
    [
      ...(onMove && !doings.first
        ? [{ id: 'up', words: 'Move up', keys: 'Alt+↑', run: () => onMove(-1) }]
        : []),
      ...(onMove && !doings.last
        ? [{ id: 'down', words: 'Move down', keys: 'Alt+↓', run: () => onMove(1) }]
        : []),
      ...(onUnpin ? [{ id: 'unpin', words: 'Unpin', keys: 'Delete', run: onUnpin }] : []),
    ],
    [
      { id: 'copy', words: 'Copy the numbers as text', keys: 'Mod+C', run: doings.onCopy },
      ...(onPicture ? pictureActions(onPicture) : []),
    ],
  ];
}

function pictureActions(onPicture: (picture: ReadingPicture, way: PictureWay) => void): NoteAction[] {
  return (['phasors', 'waveform', 'spectrum'] as const).map((picture) => ({
    id: picture,
    words: PICTURE_WORDS[picture],
    choices: PICTURE_WAYS.map(({ way, words }) => ({
      id: `${picture}.${way}`,
      words,
      run: () => onPicture(picture, way),
    })),
  }));
}

interface VerdictDoings {
  folded: boolean;
  order: number | undefined;
  onFold(): void;
  onJump: (() => void) | undefined;
  onOrder: (() => void) | undefined;
  onCopy(): void;
}

/** What can be done with a verdict. */
export function verdictActions(doings: VerdictDoings): NoteActions {
  const { order, onJump, onOrder } = doings;
  return [
    [{ id: 'fold', words: doings.folded ? 'Unfold' : 'Fold to one line', keys: 'Enter', run: doings.onFold }],
    [
      ...(onJump ? [{ id: 'jump', words: 'Jump to the part', keys: 'J', run: onJump }] : []),
      ...(onOrder && order !== undefined
        ? [{ id: 'order', words: `Rail to h ${Number(order.toFixed(2))}`, keys: 'R', run: onOrder }]
        : []),
    ],
    [{ id: 'copy', words: 'Copy as text', keys: 'Mod+C', run: doings.onCopy }],
  ];
}

/** The action a key runs on a note; Enter is its title's own click, Ctrl+C the browser's own copying. */
export function actionForKey(
  actions: NoteActions,
  event: { key: string; altKey: boolean; ctrlKey: boolean; metaKey: boolean; shiftKey: boolean },
): NoteAction | undefined {
  const arrow = event.key === 'ArrowUp' ? '↑' : event.key === 'ArrowDown' ? '↓' : event.key;
  const key = event.key.length === 1 ? event.key.toUpperCase() : arrow;
  const chord = `${event.ctrlKey || event.metaKey ? 'Mod+' : ''}${event.altKey ? 'Alt+' : ''}${key}`;
  if (event.shiftKey || chord === 'Enter' || chord === 'Mod+C') return undefined;
  return actions.flat().find((action) => action.keys === chord);
}
