import type { OutlineNode } from '../layout/index.ts';
import { busSubject, partSubject, type Subject } from '../subject.ts';

export interface OutlineRow {
  node: OutlineNode;
  subject: Subject;
  /** 1 at the top. */
  level: number;
  foldable: boolean;
  open: boolean;
}

/** The rows on view, top to bottom: what stands under a folded row is left out. */
export function outlineRows(
  tree: readonly OutlineNode[],
  folded: ReadonlySet<Subject>,
  level = 1,
): OutlineRow[] {
  return tree.flatMap((node) => {
    const subject = node.kind === 'bus' ? busSubject(node.id) : partSubject(node.id);
    const foldable = node.children.length > 0;
    const open = foldable && !folded.has(subject);
    const row = { node, subject, level, foldable, open };
    return open ? [row, ...outlineRows(node.children, folded, level + 1)] : [row];
  });
}
