import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Box,
  DENSITIES,
  type Layout,
  layoutStudy,
  type PartPlace,
  type Point,
  textWidth,
} from '../../src/drawing/layout/index.ts';
import { symbolShape } from '../../src/drawing/symbols/symbolShape.ts';
import { type Study, symbolSetOf } from '../../src/study/index.ts';
import { anyStudy, part, study } from './randomStudy.ts';

const anyDensity = fc.constantFrom(...DENSITIES);

const overlap = (a: Box, b: Box) =>
  a.x < b.x + b.width - 0.01 &&
  b.x < a.x + a.width - 0.01 &&
  a.y < b.y + b.height - 0.01 &&
  b.y < a.y + a.height - 0.01;

/** The mark's disc and the word below or beside it; left of a conductor both end at it. */
function markBoxes({ mark, hang, x }: PartPlace): Box[] {
  if (hang === 'across') return [mark];
  const left = mark.x + mark.width < x;
  const disc = { x: left ? mark.x + mark.width - 16 : mark.x, y: mark.y, width: 16, height: 16 };
  return [disc, { ...mark, y: mark.y + 16, height: mark.height - 16 }];
}

/** Everything that must not cover anything else: texts, symbols, bars, dials. */
function solids(layout: Layout, site: Study): { what: string; box: Box }[] {
  const data = new Map(site.elements.map((e) => [e.id, e]));
  return [
    ...layout.buses.flatMap((bus) => [
      {
        what: `name of ${bus.id}`,
        box: { ...bus.label, width: textWidth(bus.name, undefined, true), height: 14 },
      },
      { what: `volts of ${bus.id}`, box: { ...bus.label, y: bus.label.y + 15, height: 13 } },
      {
        what: `letters of ${bus.id}`,
        box: { x: bus.mark.x + bus.mark.width, y: bus.mark.y, width: 20, height: 14 },
      },
      { what: `mark of ${bus.id}`, box: { ...bus.mark, height: 14 } },
      { what: `bar ${bus.id}`, box: { x: bus.x1, y: bus.y - 2, width: bus.x2 - bus.x1, height: 4 } },
      ...(bus.dial
        ? [
            {
              what: `dial of ${bus.id}`,
              box: { x: bus.dial.x - 15, y: bus.dial.y - 15, width: 30, height: 30 },
            },
          ]
        : []),
    ]),
    ...layout.parts.flatMap((p) => {
      const element = data.get(p.id);
      const shape = symbolShape(element ?? { kind: p.kind }, symbolSetOf(site));
      const [along, across] = [shape.reach * 2, shape.width];
      const [width, height] = p.hang === 'across' ? [along, across] : [across, along];
      return [
        { what: `text of ${p.id}`, box: p.label },
        ...markBoxes(p).map((box) => ({ what: `mark of ${p.id}`, box })),
        {
          what: `letters of ${p.id}`,
          box: { x: p.letters.x - 14, y: p.letters.y - 11, width: 14, height: 13 },
        },
        { what: `symbol ${p.id}`, box: { x: p.x - width / 2, y: p.y - height / 2, width, height } },
      ];
    }),
  ];
}

function segments(layout: Layout): { part: string; a: Point; b: Point }[] {
  return layout.parts.flatMap((p) =>
    p.ends.flatMap((end) => end.path.slice(1).map((b, at) => ({ part: p.id, a: end.path[at] ?? b, b }))),
  );
}

describe('layout of the single-line diagram', () => {
  it('never lets a text, symbol, bar or dial cover another, on any site', () => {
    fc.assert(
      fc.property(anyStudy, anyDensity, (site, density) => {
        const all = solids(layoutStudy(site, [density]), site);
        all.forEach((one, at) => {
          for (const other of all.slice(at + 1)) {
            if (overlap(one.box, other.box)) throw new Error(`${one.what} covers ${other.what}`);
          }
        });
      }),
      { seed: 11, numRuns: 300 },
    );
  });

  it('leads no conductor through a text or a symbol, on any site', () => {
    fc.assert(
      fc.property(anyStudy, anyDensity, (site, density) => {
        const layout = layoutStudy(site, [density]);
        const boxes = solids(layout, site).filter(({ what }) => !what.startsWith('bar'));
        for (const { part: id, a, b } of segments(layout)) {
          const line: Box = {
            x: Math.min(a.x, b.x),
            y: Math.min(a.y, b.y),
            width: Math.abs(a.x - b.x) + 0.05,
            height: Math.abs(a.y - b.y) + 0.05,
          };
          for (const { what, box } of boxes) {
            if (what !== `symbol ${id}` && overlap(line, box))
              throw new Error(`the conductor of ${id} runs through ${what}`);
          }
        }
      }),
      { seed: 12, numRuns: 300 },
    );
  });

  it('lays no two conductors on each other, and meets every busbar on its bar', () => {
    fc.assert(
      fc.property(anyStudy, anyDensity, (site, density) => {
        const layout = layoutStudy(site, [density]);
        const lines = segments(layout);
        lines.forEach((one, at) => {
          for (const other of lines.slice(at + 1)) {
            for (const [along, across] of [
              ['x', 'y'],
              ['y', 'x'],
            ] as const) {
              if (one.a[across] !== one.b[across] || other.a[across] !== other.b[across]) continue;
              if (Math.abs(one.a[across] - other.a[across]) > 0.5) continue;
              const from = Math.max(
                Math.min(one.a[along], one.b[along]),
                Math.min(other.a[along], other.b[along]),
              );
              const to = Math.min(
                Math.max(one.a[along], one.b[along]),
                Math.max(other.a[along], other.b[along]),
              );
              if (to - from > 0.5) throw new Error(`${one.part} lies on ${other.part}`);
            }
          }
        });
        const bars = new Map(layout.buses.map((bus) => [bus.id, bus]));
        for (const place of layout.parts) {
          for (const end of place.ends) {
            const bar = bars.get(end.bus);
            const touch = end.path[0];
            expect(bar && touch && touch.y === bar.y && touch.x >= bar.x1 && touch.x <= bar.x2).toBe(true);
          }
        }
      }),
      { seed: 13, numRuns: 300 },
    );
  });

  it('places every busbar and every part that touches known busbars', () => {
    fc.assert(
      fc.property(anyStudy, anyDensity, (site, density) => {
        const layout = layoutStudy(site, [density]);
        expect(layout.buses.map((b) => b.id)).toEqual(site.buses.map((b) => b.id));
        const drawable = site.elements.filter((e) => !('from' in e) || e.from !== e.to).map((e) => e.id);
        expect(layout.parts.map((p) => p.id)).toEqual(drawable);
      }),
      { seed: 14, numRuns: 200 },
    );
  });
});

const at = (layout: Layout, id: string) => layout.parts.find((p) => p.id === id);
const bar = (layout: Layout, id: string) => layout.buses.find((b) => b.id === id);

/** One intake, one transformer, one board with a motor and a bank. */
const plant = study(
  [
    ['in', 20_000],
    ['main', 400],
  ],
  [
    part('supply', 'grid', 'in', ''),
    part('transformer', 't1', 'in', 'main'),
    part('motor', 'm', 'main', ''),
    part('bank', 'c', 'main', ''),
  ],
);

describe('shape of the single-line diagram', () => {
  it('puts the supply on top, the lower voltage below it and the conductors straight', () => {
    const layout = layoutStudy(plant);
    expect(at(layout, 'grid')?.hang).toBe('above');
    expect(bar(layout, 'main')?.storey).toBe(1);
    expect(at(layout, 't1')?.x).toBe(at(layout, 'grid')?.x);
    expect(at(layout, 't1')?.foot).toMatchObject({ bus: 'main', x: at(layout, 't1')?.x });
    expect(at(layout, 'm')?.hang).toBe('below');
  });

  it('brings parallel transformers down to one bar side by side', () => {
    const twin = { ...plant, elements: [...plant.elements, part('transformer', 't2', 'in', 'main')] };
    const layout = layoutStudy(twin);
    const [t1, t2] = [at(layout, 't1'), at(layout, 't2')];
    expect(t2?.y).toBe(t1?.y);
    expect(t2?.ends.every((end) => end.path.every((point) => point.x === t2.x))).toBe(true);
    expect(bar(layout, 'main')?.x2).toBeGreaterThan(t2?.x ?? Number.POSITIVE_INFINITY);
  });

  it('ties two boards of one storey end to end with a coupler on its side', () => {
    const two = study(
      [
        ['in', 20_000],
        ['a', 400],
        ['b', 400],
      ],
      [
        part('supply', 'grid', 'in', ''),
        part('transformer', 't1', 'in', 'a'),
        part('transformer', 't2', 'in', 'b'),
        part('coupler', 'tie', 'a', 'b'),
        part('load', 'l', 'a', ''),
      ],
    );
    const layout = layoutStudy(two);
    const tie = at(layout, 'tie');
    expect(tie?.hang).toBe('across');
    expect(tie?.y).toBe(bar(layout, 'a')?.y);
    expect(tie?.top.x).toBe(bar(layout, 'a')?.x2);
    expect(tie?.foot?.x).toBe(bar(layout, 'b')?.x1);
  });

  it('sets a busbar reached by a coupler alone beside its neighbour', () => {
    const site = study(
      [
        ['in', 400],
        ['b', 400],
      ],
      [part('supply', 'grid', 'in', ''), part('coupler', 'tie', 'in', 'b')],
    );
    const layout = layoutStudy(site);
    expect(bar(layout, 'b')?.storey).toBe(0);
    expect(bar(layout, 'b')?.x1).toBeGreaterThan(bar(layout, 'in')?.x2 ?? 0);
  });

  it('closes a ring over a lane of its own, down to the second busbar', () => {
    const ring = study(
      [
        ['in', 11_000],
        ['a', 11_000],
        ['b', 11_000],
        ['c', 11_000],
      ],
      [
        part('supply', 'grid', 'in', ''),
        part('cable', 'k1', 'in', 'a'),
        part('cable', 'k2', 'in', 'b'),
        part('cable', 'k3', 'a', 'c'),
        part('cable', 'k4', 'b', 'c'),
      ],
    );
    const layout = layoutStudy(ring);
    const closing = at(layout, 'k4');
    expect(closing?.bus).toBe('b');
    expect(closing?.foot?.bus).toBe('c');
    expect(closing?.ends[1]?.path).toHaveLength(4);
  });

  it('stands separate islands side by side and gives an empty study room for its hint', () => {
    const two = study(
      [
        ['a', 400],
        ['b', 400],
      ],
      [part('load', 'l', 'a', '')],
    );
    const layout = layoutStudy(two);
    expect(bar(layout, 'a')?.island).not.toBe(bar(layout, 'b')?.island);
    expect(bar(layout, 'b')?.y).toBe(bar(layout, 'a')?.y);
    expect(layoutStudy(study([], [])).width).toBeGreaterThan(400);
  });

  it('follows the order along the busbar, and the file where an order names nothing', () => {
    const turned: Study = { ...plant, view: { orderAlong: { main: ['c', 'gone'] } } };
    const layout = layoutStudy(turned);
    expect(at(layout, 'c')?.x).toBeLessThan(at(layout, 'm')?.x ?? 0);
    const plain = layoutStudy(plant);
    expect(at(plain, 'c')?.x).toBeGreaterThan(at(plain, 'm')?.x ?? 0);
  });
});

describe('steadiness of the layout', () => {
  it('gives the same places for the same study, whatever is in service', () => {
    fc.assert(
      fc.property(anyStudy, (site) => {
        const switched = { ...site, elements: site.elements.map((e) => ({ ...e, on: false })) };
        const places = (s: Study) => layoutStudy(s).parts.map(({ id, x, y }) => [id, x, y]);
        expect(places(site)).toEqual(places(structuredClone(site)));
        expect(places(switched)).toEqual(places(site));
      }),
      { seed: 15, numRuns: 100 },
    );
  });

  it('moves nothing left of a part hung at the end of a bar', () => {
    const longer = { ...plant, elements: [...plant.elements, part('load', 'new', 'main', '')] };
    const [before, after] = [layoutStudy(plant), layoutStudy(longer)];
    for (const place of before.parts) expect(at(after, place.id)).toEqual(place);
    expect(bar(after, 'main')?.x1).toBe(bar(before, 'main')?.x1);
    expect(bar(after, 'main')?.x2).toBeGreaterThan(bar(before, 'main')?.x2 ?? 0);
    expect(bar(after, 'in')).toEqual(bar(before, 'in'));
  });
});
