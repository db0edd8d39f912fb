import type { TrayKind } from './TrayKind.ts';

/**
 * What is in the hand.
 *  new:   a part from the tray; with `upper` its upper busbar is chosen and its lower end looks for one.
 *  parts: parts on the drawing, with all that hangs below them; `grip` is the one under the pointer.
 *  end:   one end of a series part.
 */
export type Held =
  | { what: 'new'; kind: TrayKind; upper?: string }
  | { what: 'parts'; ids: readonly string[]; grip: string }
  | { what: 'end'; id: string; end: 'from' | 'to' };
