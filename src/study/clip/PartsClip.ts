import type { Study } from '../types.ts';

/**
 * Copied parts on their way to another busbar, window or study: a small study of their own, whose busbars in
 * `hangsFrom` stay behind. What hangs from those is hung from the busbar pasted on.
 */
export interface PartsClip {
  format: 'varwright-parts';
  version: 1;
  study: Study;
  hangsFrom: string[];
  /** How many values cases set otherwise for these parts; they stay behind with the cases. */
  caseValues: number;
}

/** The clip as it stands in the system's clipboard: JSON whose first field is the marker. */
export function clipText(clip: PartsClip): string {
  return JSON.stringify(clip, null, 1);
}
