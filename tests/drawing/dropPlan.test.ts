import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dropPlan } from '../../src/drawing/gestures/dropPlan.ts';
import { neighbour } from '../../src/drawing/keyboard/neighbour.ts';
import { layoutStudy, siteOutline } from '../../src/drawing/layout/index.ts';
import { elementById, elementKinds, type Study } from '../../src/study/index.ts';
import { anyStudy, part, study } from './randomStudy.ts';

const plant = study(
  [
    ['in', 20_000],
    ['main', 400],
    ['sub', 400],
  ],
  [
    part('supply', 'grid', 'in', ''),
    part('transformer', 't1', 'in', 'main'),
    part('motor', 'm', 'main', ''),
    part('bank', 'c', 'main', ''),
    part('cable', 'k', 'main', 'sub'),
    part('load', 'l', 'sub', ''),
  ],
);
const layout = layoutStudy(plant);
const place = (id: string) => {
  const found = layout.parts.find((p) => p.id === id);
  if (!found) throw new RangeError(`no part ${id}`);
  return found;
};
const under = (bus: string, x: number) => ({ x, y: (layout.buses.find((b) => b.id === bus)?.y ?? 0) + 60 });

describe('what letting go would do', () => {
  it('hangs a bank between the parts it is dropped between', () => {
    const x = (place('m').x + place('c').x) / 2;
    const plan = dropPlan(plant, layout, { what: 'new', kind: 'bank' }, under('main', x));
    const after = plan.edit?.apply(plant) ?? plant;
    const added = after.elements.at(-1);
    expect(added).toMatchObject({ kind: 'bank', bus: 'main' });
    const xs = Object.fromEntries(layoutStudy(after).parts.map((p) => [p.id, p.x]));
    expect(xs.m).toBeLessThan(xs[added?.id ?? ''] ?? 0);
    expect(xs[added?.id ?? '']).toBeLessThan(xs.c ?? 0);
  });

  it('brings a lower busbar with a transformer, cable, reactor, coupler and R-L-C', () => {
    for (const kind of ['transformer', 'cable', 'reactor', 'coupler', 'branch'] as const) {
      const plan = dropPlan(plant, layout, { what: 'new', kind }, { bus: 'main' });
      const after = plan.edit?.apply(plant) ?? plant;
      expect(after.buses).toHaveLength(4);
      expect(after.elements.at(-1)).toMatchObject({ from: 'main', to: after.buses[3]?.id });
    }
  });

  it('moves a part to the busbar it is dropped under, and its end alone by its handle', () => {
    const moved = dropPlan(
      plant,
      layout,
      { what: 'parts', ids: ['c'], grip: 'c' },
      under('sub', place('l').x + 20),
    );
    expect(elementById(moved.edit?.apply(plant) ?? plant, 'c')).toMatchObject({ bus: 'sub' });
    const end = dropPlan(plant, layout, { what: 'end', id: 't1', end: 'to' }, under('sub', place('l').x));
    expect(elementById(end.edit?.apply(plant) ?? plant, 't1')).toMatchObject({ from: 'in', to: 'sub' });
  });

  it('refuses both ends of a part at one busbar, and a drop on free paper, in words', () => {
    const same = dropPlan(plant, layout, { what: 'end', id: 'k', end: 'to' }, { bus: 'main' });
    expect(same.edit).toBeUndefined();
    expect(same.words).toContain('both ends');
    const free = dropPlan(plant, layout, { what: 'new', kind: 'load' }, { x: -500, y: -500 });
    expect(free.edit).toBeUndefined();
    expect(free.words).toContain('busbar');
  });

  it('changes the order along a busbar, and nothing when a part is put back', () => {
    const swap = dropPlan(
      plant,
      layout,
      { what: 'parts', ids: ['c'], grip: 'c' },
      under('main', place('m').x - 10),
    );
    const after = swap.edit?.apply(plant) ?? plant;
    expect(after.view?.orderAlong?.main?.slice(0, 2)).toEqual(['c', 'm']);
    expect(
      dropPlan(plant, layout, { what: 'parts', ids: ['c'], grip: 'c' }, under('main', place('c').x)).edit,
    ).toBeUndefined();
  });

  it('starts an empty study with a supply and the busbar it feeds', () => {
    const empty = study([], []);
    const plan = dropPlan(empty, layoutStudy(empty), { what: 'new', kind: 'supply' }, { x: 100, y: 100 });
    const after = plan.edit?.apply(empty) ?? empty;
    expect(after.buses).toHaveLength(1);
    expect(after.elements).toMatchObject([{ kind: 'supply', bus: after.buses[0]?.id }]);
  });

  it('plans a drop anywhere on any site without touching the study', () => {
    const point = fc.record({
      x: fc.integer({ min: -200, max: 2500 }),
      y: fc.integer({ min: -100, max: 1500 }),
    });
    fc.assert(
      fc.property(anyStudy, point, fc.constantFrom(...elementKinds), (site, at, kind) => {
        const before = structuredClone(site);
        const places = layoutStudy(site);
        const plan = dropPlan(site, places, { what: 'new', kind }, at);
        if (plan.edit) layoutStudy(plan.edit.apply(site));
        for (const { id } of site.elements)
          dropPlan(site, places, { what: 'parts', ids: [id], grip: id }, at);
        expect(site).toEqual(before);
      }),
      { seed: 21, numRuns: 60 },
    );
  });
});

describe('keyboard along the drawing', () => {
  it('reaches every part and busbar of an island by arrows', () => {
    const seen = new Set(['bus:in']);
    for (const subject of seen) {
      for (const direction of ['left', 'right', 'up', 'down'] as const) {
        const next = neighbour(layout, subject, direction);
        if (next) seen.add(next);
      }
    }
    expect(seen.size).toBe(plant.buses.length + plant.elements.length);
  });
});

describe('outline of the site', () => {
  it('lists every busbar and every drawn part exactly once, on any site', () => {
    fc.assert(
      fc.property(anyStudy, (site: Study) => {
        const listed: string[] = [];
        const visit = (nodes: ReturnType<typeof siteOutline>) => {
          for (const node of nodes) {
            listed.push(`${node.kind}:${node.id}`);
            visit(node.children);
          }
        };
        visit(siteOutline(site));
        const drawn = layoutStudy(site);
        const expected = [
          ...drawn.buses.map((b) => `bus:${b.id}`),
          ...drawn.parts.map((p) => `element:${p.id}`),
        ];
        expect(listed.sort()).toEqual(expected.sort());
      }),
      { seed: 22, numRuns: 150 },
    );
  });
});
