import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { PAPER_INK, phaseInk } from '../../src/charts/index.ts';
import { phaseColourSets } from '../../src/study/index.ts';

type Theme = 'light' | 'dark';

const sheet = readFileSync(resolve(import.meta.dirname, '../../src/app/theme/theme.css'), 'utf8');

/** The custom properties of a theme; dark has those of light that it does not set itself. */
function tokens(theme: Theme): Record<string, string> {
  const read = (selector: string) => {
    const block = sheet.slice(sheet.indexOf(`${selector} {`)).split('}')[0] ?? '';
    return Object.fromEntries(
      [...block.matchAll(/--([\w-]+): (#[0-9a-f]{6});/g)].map(([, name, ink]) => [name, ink]),
    );
  };
  return { ...read(':root'), ...(theme === 'dark' ? read(':root[data-theme="dark"]') : {}) };
}

function channels(ink: string): number[] {
  return [1, 3, 5].map((at) => Number.parseInt(ink.slice(at, at + 2), 16));
}

/** Relative luminance of an sRGB colour, WCAG 2.2. */
function luminance(ink: string): number {
  const [r = 0, g = 0, b = 0] = channels(ink).map((channel) => {
    const share = channel / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

/** A colour laid over another with an opacity, as color-mix does in sRGB. */
function mixed(ink: string, share: number, ground: string): string {
  const under = channels(ground);
  const mix = channels(ink).map((channel, i) => Math.round(channel * share + (under[i] ?? 0) * (1 - share)));
  return `#${mix.map((channel) => channel.toString(16).padStart(2, '0')).join('')}`;
}

const inks = ['ink', 'ink-2', 'accent', 'current', 'reactive', 'pass', 'watch', 'fail', 'pen'];

for (const theme of ['light', 'dark'] as const) {
  describe(`the ${theme} theme`, () => {
    const ink = tokens(theme);
    const of = (name: string): string => {
      const value = ink[name];
      if (!value) throw new Error(`no colour --${name}`);
      return value;
    };

    it('keeps 4.5 : 1 between every ink and every ground it is written on', () => {
      for (const name of inks) {
        for (const ground of ['ground', 'sheet']) {
          expect(contrast(of(name), of(ground)), `${name} on ${ground}`).toBeGreaterThanOrEqual(4.5);
        }
      }
    });

    it('keeps it on the tinted ground of a failing note and of what is chosen', () => {
      const failing = mixed(of('fail'), 0.09, of('sheet'));
      for (const name of ['ink', 'ink-2', 'accent', 'fail']) {
        expect(contrast(of(name), failing), name).toBeGreaterThanOrEqual(4.5);
      }
      const chosen = mixed(of('accent'), 0.14, of('sheet'));
      for (const name of ['ink', 'ink-2'])
        expect(contrast(of(name), chosen), name).toBeGreaterThanOrEqual(4.5);
    });

    it('draws the phases of every set of colours legibly, and tells its three apart', () => {
      for (const { id } of phaseColourSets) {
        const three = phaseInk(id, theme);
        for (const one of three) {
          expect(contrast(one, of('sheet')), `${id} on the sheet`).toBeGreaterThanOrEqual(4.5);
          expect(contrast(one, of('ground')), `${id} on the ground`).toBeGreaterThanOrEqual(4.5);
        }
        expect(new Set(three).size, id).toBe(3);
      }
    });
  });
}

it('pictures that leave the page have the colours of the light theme', () => {
  const ink = tokens('light');
  const { ground: _ground, sheet: _sheet, phases: _phases, ink2, voltage, ...same } = PAPER_INK;
  for (const [name, value] of Object.entries(same)) expect(value, name).toBe(ink[name]);
  expect(ink2).toBe(ink['ink-2']);
  expect(voltage).toBe(ink.ink);
});
