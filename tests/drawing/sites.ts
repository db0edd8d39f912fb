import { addPart, type ElementKind, newStudy, type Study, updateBus } from '../../src/study/index.ts';

/** A part with typical data hung from a busbar; of a series part the busbar it brings, named. */
class Site {
  study: Study;

  constructor(title: string) {
    const empty = newStudy({ title, frequencyHz: 50 });
    this.study = { ...empty, buses: [{ id: 'intake', name: 'Intake', nominalV: 20_000, pcc: true }] };
  }

  hang(kind: ElementKind, bus: string, name: string, values: Record<string, unknown> = {}): void {
    this.study = addPart(this.study, { kind, bus, values: { name, ...values } }).apply(this.study);
  }

  join(
    kind: ElementKind,
    from: string,
    to: string,
    name: string,
    values: Record<string, unknown> = {},
  ): void {
    this.study = addPart(this.study, { kind, bus: from, to, values: { name, ...values } }).apply(this.study);
  }

  lead(
    kind: ElementKind,
    bus: string,
    name: string,
    lower: string,
    values: Record<string, unknown> = {},
  ): string {
    const edit = addPart(this.study, { kind, bus, values: { name, ...values } });
    this.study = edit.apply(this.study);
    const id = edit.busId ?? '';
    this.study = updateBus(this.study, id, { name: lower }).apply(this.study);
    return id;
  }
}

const LOADS: [ElementKind, string, Record<string, unknown>][] = [
  ['motor', 'Compressors', { ratedKW: 90 }],
  ['converter', 'Air handlers', { kW: 60 }],
  ['load', 'Lighting, sockets', { kW: 40 }],
  ['motor', 'Chilled water pumps', { ratedKW: 37 }],
  ['converter', 'Conveyor', { kW: 22 }],
  ['load', 'Kitchen', { kW: 30 }],
  ['motor', 'Fans', { ratedKW: 15 }],
  ['load', 'Trace heating', { kW: 18 }],
];

function hangLoads(site: Site, bus: string, count: number, from = 0): void {
  for (let at = 0; at < count; at++) {
    const [kind, name, values] = LOADS[(at + from) % LOADS.length] ?? ['load', 'Load', {}];
    site.hang(kind, bus, name, values);
  }
}

/** Twenty-five parts: supply, two parallel transformers, a main board with ten parts, two sub-boards. */
export function typicalSite(): Study {
  const site = new Site('Typical site');
  site.hang('supply', 'intake', 'Grid');
  const main = site.lead('transformer', 'intake', 'T1', 'Main board', { ratedKVA: 1000 });
  site.join('transformer', 'intake', main, 'T2', { ratedKVA: 1000 });
  hangLoads(site, main, 7);
  site.hang('bank', main, 'Bank C1');
  const first = site.lead('cable', main, 'W1', 'Drives board', { ratedA: 630 });
  const second = site.lead('cable', main, 'W2', 'Workshop board', { ratedA: 400 });
  hangLoads(site, first, 6, 1);
  hangLoads(site, second, 6, 3);
  return site.study;
}

/** About sixty parts: two infeeds, a medium-voltage ring, parallel transformers, a tie between main boards. */
export function ringSite(): Study {
  const site = new Site('Site with a ring');
  site.hang('supply', 'intake', 'Grid north');
  const east = site.lead('cable', 'intake', 'Ring 1', 'East substation');
  const west = site.lead('cable', 'intake', 'Ring 2', 'West substation');
  const south = site.lead('cable', east, 'Ring 3', 'South substation');
  site.join('cable', west, south, 'Ring 4');
  const mainA = site.lead('transformer', east, 'T1', 'Main board A', { ratedKVA: 1000 });
  site.join('transformer', east, mainA, 'T2', { ratedKVA: 1000 });
  const mainB = site.lead('transformer', west, 'T3', 'Main board B', { ratedKVA: 1600 });
  site.join('coupler', mainA, mainB, 'Tie A–B', { on: false });
  const mainC = site.lead('transformer', south, 'T4', 'Pump house', { ratedKVA: 630 });
  site.hang('generator', mainC, 'Standby set');
  for (const [board, count] of [
    [mainA, 8],
    [mainB, 9],
    [mainC, 5],
  ] as const) {
    hangLoads(site, board, count);
    site.hang('bank', board, 'Bank');
  }
  const boards: [string, string, number][] = [
    [mainA, 'Line 1 board', 5],
    [mainA, 'Line 2 board', 4],
    [mainB, 'Paint shop', 6],
    [mainB, 'Offices', 3],
  ];
  boards.forEach(([above, name, count], at) => {
    hangLoads(site, site.lead('cable', above, `W${at + 1}`, name), count, at);
  });
  return site.study;
}

/** A large site of about so many parts: substations on 20 kV cables, each with a main board and sub-boards. */
export function largeSite(parts: number): Study {
  const site = new Site(`Site of ${parts} parts`);
  site.hang('supply', 'intake', 'Grid', { shortCircuitMVA: Math.max(500, 3 * parts) });
  for (let at = 1; site.study.elements.length < parts; at++) {
    const station = site.lead('cable', 'intake', `Feeder ${at}`, `Substation ${at}`);
    const main = site.lead('transformer', station, `T${at}`, `Main board ${at}`, { ratedKVA: 1600 });
    hangLoads(site, main, Math.min(6, parts - site.study.elements.length), at);
    if (site.study.elements.length < parts) site.hang('bank', main, `Bank ${at}`);
    for (let sub = 1; sub <= 3 && site.study.elements.length < parts; sub++) {
      const board = site.lead('cable', main, `W${at}.${sub}`, `Board ${at}.${sub}`);
      hangLoads(site, board, Math.min(6, parts - site.study.elements.length), at + sub);
    }
  }
  return site.study;
}
