import { busById, elementById, isSeries, type Study } from '../../study/index.ts';
import { arrange } from './alongBusbar.ts';
import { siteGraph } from './siteGraph.ts';
import { storeysOf } from './storeys.ts';

/** The site as a nested list: busbars with their parts, a series part with the busbar below it. */
export interface OutlineNode {
  kind: 'bus' | 'element';
  id: string;
  children: OutlineNode[];
  /** For a part that closes a ring or ties: the busbar at its other end, listed elsewhere. */
  joins?: string;
}

/** The drawing's own order as a tree; every busbar and every part stands in it once. */
export function siteOutline(study: Study): OutlineNode[] {
  const graph = siteGraph(study);
  const storeys = storeysOf(graph);
  const arrangement = arrange(graph, storeys);
  const idOf = (bus: number) => study.buses[bus]?.id ?? '';
  const part = (id: string, children: OutlineNode[], joins?: string): OutlineNode => ({
    kind: 'element',
    id,
    children,
    ...(joins === undefined ? {} : { joins }),
  });
  const busNode = (bus: number): OutlineNode => {
    const children = (arrangement.feeds[bus] ?? []).map((feed) => part(feed.id, []));
    for (const slot of arrangement.slots[bus] ?? []) {
      if (slot.kind === 'leaf') children.push(part(slot.part.id, []));
      else if (slot.kind === 'column') children.push(part(slot.part.id, [], idOf(slot.to)));
      else {
        slot.parts.forEach((lead, at) => {
          children.push(
            at === 0 ? part(lead.id, [busNode(slot.below)]) : part(lead.id, [], idOf(slot.below)),
          );
        });
      }
    }
    for (const tie of arrangement.ties.filter((t) => t.left === bus)) {
      const brought = (arrangement.beside[bus] ?? []).includes(tie.right);
      children.push(
        brought ? part(tie.part.id, [busNode(tie.right)]) : part(tie.part.id, [], idOf(tie.right)),
      );
    }
    for (const right of arrangement.beside[bus] ?? []) {
      if (!arrangement.ties.some((tie) => tie.left === bus && tie.right === right))
        children.push(busNode(right));
    }
    return { kind: 'bus', id: idOf(bus), children };
  };
  return storeys.tops.flatMap((tops) => tops.map(busNode));
}

/** What an outline row says: the name, and where a part of a ring leads. */
export function outlineWords(study: Study, node: OutlineNode): string {
  const record = node.kind === 'bus' ? busById(study, node.id) : elementById(study, node.id);
  const name = record?.name?.trim() || node.id;
  const part = node.kind === 'element' ? elementById(study, node.id) : undefined;
  if (node.joins === undefined || !part || !isSeries(part)) return name;
  const other = busById(study, node.joins);
  return `${name}, joins ${other?.name?.trim() || node.joins}`;
}
