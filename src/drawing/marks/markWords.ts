import type { MarkKind } from '../../study/index.ts';

/** What each mark is called in its tool, and how it is placed. */
export const markWords: Readonly<Record<MarkKind, { tool: string; how: string }>> = {
  note: {
    tool: 'Write on the drawing',
    how: 'Note: press where the words stand, or arrows and Enter. Escape gives it up.',
  },
  cloud: {
    tool: 'Cloud round an area',
    how: 'Cloud: drag over the area, or arrows, Enter, arrows, Enter. Escape gives it up.',
  },
  box: {
    tool: 'Box round an area',
    how: 'Box: drag over the area, or arrows, Enter, arrows, Enter. Escape gives it up.',
  },
  arrow: {
    tool: 'Arrow',
    how: 'Arrow: drag from its foot to its head, or arrows, Enter, arrows, Enter. Escape gives it up.',
  },
};
