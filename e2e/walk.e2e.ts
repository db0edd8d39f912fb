import { expect, type Page, test } from '@playwright/test';
import type { Study, StudyElement } from '../src/study/index.ts';
import {
  carry,
  carryFromTray,
  middle,
  part,
  saveByDownload,
  savedStudy,
  settled,
  under,
} from './workbench.ts';

/** A field by how its label begins, and what is typed into it. */
type Entry = readonly [label: string, text: string];

interface Part {
  kind: StudyElement['kind'];
  name?: string;
  entries: readonly Entry[];
  /** What stands in the study afterwards. */
  data: Record<string, unknown>;
}

interface Board {
  name: string;
  /** The cable that feeds it from the main board. */
  feed: Part;
  parts: readonly Part[];
}

const motor = (name: string, kW: number, count = 1): Part => ({
  kind: 'motor',
  name,
  entries: [
    ['rated shaft power, each', String(kW)],
    ...(count > 1 ? [['number of motors', String(count)] as const] : []),
  ],
  data: { ratedKW: kW, ...(count > 1 ? { count } : {}) },
});
const drive = (name: string, kW: number): Part => ({
  kind: 'converter',
  name,
  entries: [['active power, total', String(kW)]],
  data: { kW, spectrum: 'drive-reactance-3' },
});
const load = (kW: number, powerFactor?: number): Part => ({
  kind: 'load',
  entries: [
    ['active power, total', String(kW)],
    ...(powerFactor === undefined ? [] : [['power factor cos φ', String(powerFactor)] as const]),
  ],
  data: { kW, powerFactor: powerFactor ?? 0.85 },
});
const cable = (lengthM: number): Part => ({
  kind: 'cable',
  entries: [['length', String(lengthM)]],
  data: { lengthM },
});
const steps = (count: number, kvar: number) => Array.from({ length: count }, () => ({ kvar }));

const supply: Part = {
  kind: 'supply',
  entries: [
    ['fault level, maximum', '300'],
    ['fault level, minimum', '180'],
  ],
  data: { shortCircuitMVA: 300, shortCircuitMVAMin: 180 },
};
const transformer: Part = {
  kind: 'transformer',
  entries: [
    ['rated power', '1600'],
    ['load loss', '12'],
  ],
  data: { ratedKVA: 1600, loadLossKW: 12, ukPercent: 6, hvV: 20_000, lvV: 400 },
};
const onMain: readonly Part[] = [
  {
    kind: 'bank',
    entries: [
      ['steps', '8x50'],
      ['detuning', '7'],
    ],
    data: { steps: steps(8, 50), detuningPercent: 7, ratedV: 440 },
  },
  motor('Compressors', 132, 2),
  motor('Jaw', 90),
  drive('Main belt', 160),
  load(120, 0.9),
];
const boards: readonly Board[] = [
  {
    name: 'Crusher',
    feed: cable(80),
    parts: [
      motor('Cone', 200),
      motor('Feeder', 75),
      drive('Belt', 110),
      load(40),
      { kind: 'bank', entries: [['steps', '4x25']], data: { steps: steps(4, 25), ratedV: 440 } },
    ],
  },
  {
    name: 'Screens',
    feed: cable(120),
    parts: [
      drive('Deck 1', 55),
      drive('Deck 2', 45),
      motor('Fans', 30),
      load(25),
      {
        kind: 'filter',
        entries: [['tuned order', '6.7']],
        data: { tunedOrder: 6.7, kvar: 100, type: 'single-tuned' },
      },
    ],
  },
  {
    name: 'Workshop',
    feed: cable(60),
    parts: [load(60, 0.95), motor('Saw', 15), drive('Lathe', 22), load(30)],
  },
];

/** The whole site stands in the study: every part where it belongs, with what was typed. */
function siteIsComplete(study: Study): void {
  const busNamed = (name: string) => {
    const bus = study.buses.find((item) => item.name === name);
    if (!bus)
      throw new Error(`no busbar ${name}; there are ${study.buses.map((item) => item.name).join(', ')}`);
    return bus.id;
  };
  const standsAt = (wanted: Part, ends: Record<string, string>) => {
    const { kind, name, data } = wanted;
    const found = study.elements.filter(
      (element) => element.kind === kind && (name === undefined || element.name === name),
    );
    expect(found, `${kind} ${name ?? ''}`).toContainEqual(expect.objectContaining({ ...data, ...ends }));
  };
  const [intake, main] = [busNamed('Intake'), busNamed('Main board')];
  expect(study.elements).toHaveLength(25);
  expect(study.buses).toHaveLength(5);
  standsAt(supply, { bus: intake });
  const feeds = study.elements.filter((element) => element.kind === 'transformer');
  expect(feeds).toHaveLength(2);
  for (const feed of feeds) expect(feed).toMatchObject({ ...transformer.data, from: intake, to: main });
  for (const one of onMain) standsAt(one, { bus: main });
  for (const board of boards) {
    standsAt(board.feed, { from: main, to: busNamed(board.name) });
    for (const one of board.parts) standsAt(one, { bus: busNamed(board.name) });
  }
}

/** Presses keys as a person does, counts each chord once, and sees after each that the focus is somewhere. */
class Keys {
  count = 0;
  constructor(private readonly page: Page) {}

  async press(...chords: string[]): Promise<void> {
    for (const chord of chords) {
      await this.page.keyboard.press(chord);
      this.count += 1;
      const where = await this.page.evaluate(() => document.activeElement?.tagName ?? 'nothing');
      expect(where, `after ${chord}, key ${this.count}`).not.toMatch(/^(BODY|nothing)$/);
    }
  }

  /** Types over what is selected. */
  async type(text: string): Promise<void> {
    for (const character of text) await this.press(character);
  }
}

/** The letter each kind has in the tray. */
const letters = {
  supply: 's',
  transformer: 't',
  cable: 'c',
  motor: 'm',
  converter: 'd',
  load: 'l',
  bank: 'b',
  filter: 'f',
} as const;

function letterOf(kind: Part['kind']): string {
  const found = Object.entries(letters).find(([name]) => name === kind);
  if (!found) throw new Error(`no letter for ${kind}`);
  return found[1];
}

async function focusedLabel(page: Page): Promise<string> {
  return page.evaluate(() => {
    const field = document.activeElement;
    return field instanceof HTMLInputElement || field instanceof HTMLSelectElement
      ? (field.labels?.[0]?.textContent ?? field.getAttribute('aria-label') ?? '').trim()
      : '';
  });
}

/** In the open slip: the name by Shift and Enter, each field by Enter, and out by Ctrl and Enter. */
async function enterData(page: Page, keys: Keys, { name, entries }: Pick<Part, 'name' | 'entries'>) {
  if (name !== undefined) {
    await keys.press('Shift+Enter');
    await keys.type(name);
    await keys.press('Enter');
  }
  for (const [label, text] of entries) {
    for (let fields = 0; !(await focusedLabel(page)).startsWith(label); fields += 1) {
      if (fields > 12) throw new Error(`Enter never reaches "${label}"`);
      await keys.press('Enter');
    }
    await keys.type(text);
  }
  await keys.press('Control+Enter');
  await expect(page.locator('.slip')).toHaveCount(0);
}

async function addByKeys(page: Page, keys: Keys, wanted: Part): Promise<void> {
  await keys.press(letterOf(wanted.kind));
  await enterData(page, keys, wanted);
}

test('by keyboard alone a site of 25 parts is entered from nothing in at most 350 keystrokes', async ({
  page,
}, info) => {
  test.setTimeout(240_000);
  await saveByDownload(page);
  await page.goto('/');
  await expect(page.getByRole('region', { name: 'Drawing' })).toBeVisible();
  const keys = new Keys(page);
  await addByKeys(page, keys, supply);
  await addByKeys(page, keys, transformer);
  await keys.press('Control+d', 'ArrowDown', 'Enter');
  await enterData(page, keys, { name: 'Main board', entries: [] });
  for (const one of onMain) await addByKeys(page, keys, one);
  for (const board of boards) {
    await addByKeys(page, keys, board.feed);
    await keys.press('ArrowDown', 'Enter');
    await enterData(page, keys, { name: board.name, entries: [] });
    for (const one of board.parts) await addByKeys(page, keys, one);
    // From the last part to its busbar, the cable above it, and the main board.
    await keys.press('ArrowUp', 'ArrowUp', 'ArrowUp');
  }
  info.annotations.push({ type: 'keystrokes', description: String(keys.count) });
  console.log(`the walk took ${keys.count} keystrokes`);
  expect(keys.count).toBeLessThanOrEqual(350);
  await settled(page);
  siteIsComplete(await savedStudy(page));
});

/** Drops a kind on a busbar, clicks it again, and types into the fields its slip opens with. */
async function addByMouse(page: Page, bus: RegExp, fraction: number, wanted: Part): Promise<void> {
  await carryFromTray(page, wanted.kind, await under(part(page, bus), fraction));
  await page.mouse.up();
  const symbol = page.locator('.part.selected .hit').first();
  await expect(symbol).toBeVisible();
  await settledPlace(page);
  const at = await middle(symbol);
  await page.mouse.click(at.x, at.y);
  await fillByMouse(page, wanted);
}

/** The drawing glides to its new places: waits until the chosen part has stood still for a while. */
async function settledPlace(page: Page): Promise<void> {
  const chosen = page.locator('.part.selected .hit').first();
  let before = '';
  await expect
    .poll(
      async () => {
        const now = JSON.stringify(await chosen.boundingBox());
        const still = now === before;
        before = now;
        return still;
      },
      { intervals: [250] },
    )
    .toBe(true);
}

async function fillByMouse(page: Page, { name, entries }: Pick<Part, 'name' | 'entries'>): Promise<void> {
  const slip = page.locator('.slip');
  await expect(slip).toBeVisible();
  const all: Entry[] = [...(name === undefined ? [] : [['Name', name] as const]), ...entries];
  for (const [label, text] of all) {
    await slip
      .getByLabel(new RegExp(`^${label}`))
      .first()
      .click();
    await page.keyboard.press('Control+a');
    await page.keyboard.type(text);
  }
  await slip.getByRole('button', { name: 'Close the data slip' }).click();
  await expect(slip).toHaveCount(0);
}

async function nameBusbar(page: Page, bus: RegExp, name: string): Promise<void> {
  const label = part(page, bus).locator('.bus-name, text').first();
  for (let clicks = 0; clicks < 2; clicks += 1) {
    const at = await middle(label);
    await page.mouse.click(at.x, at.y);
  }
  await fillByMouse(page, { name, entries: [] });
}

// Waits for the drawing: the 25th part hangs beyond the pane's right edge, and a drop does not bring it into view.
test.fixme('the same site by mouse: parts dropped on busbars, a foot dragged over, data typed into their slips', async ({
  page,
}) => {
  test.setTimeout(240_000);
  await saveByDownload(page);
  await page.goto('/');
  await carryFromTray(page, 'supply', { x: 600, y: 200 });
  await page.mouse.up();
  const first = page.locator('.part.selected .hit').first();
  await settledPlace(page);
  const at = await middle(first);
  await page.mouse.click(at.x, at.y);
  await fillByMouse(page, supply);
  await addByMouse(page, /^busbar, Intake/, 0.5, transformer);
  await nameBusbar(page, /^busbar, 400 V/, 'Main board');
  await addByMouse(page, /^busbar, Intake/, 0.95, transformer);
  await settledPlace(page);
  const foot = page.locator('[data-end]:not([data-end="bus1"]) .handle');
  await carry(page, await middle(foot), await under(part(page, /^busbar, Main board/), 0.7));
  await page.mouse.up();
  for (const one of onMain) await addByMouse(page, /^busbar, Main board/, 0.97, one);
  for (const board of boards) {
    await addByMouse(page, /^busbar, Main board/, 0.97, board.feed);
    await nameBusbar(page, /^busbar, 400 V/, board.name);
    for (const one of board.parts) await addByMouse(page, new RegExp(`^busbar, ${board.name}`), 0.97, one);
  }
  await settled(page);
  siteIsComplete(await savedStudy(page));
});
