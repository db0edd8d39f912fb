import { describe, expect, it } from 'vitest';
import { checkStudy } from '../../src/study/index.ts';
import { looseStudy } from './exampleStudies.ts';

describe('a field misspelt in a case', () => {
  it('is warned of at its place, since the case would change nothing', () => {
    const study = looseStudy('1-detuned-400v');
    study.cases[1]!.changes.push({ element: 'drv', set: { kw: 30 } });
    const at = study.cases[1]!.changes.length - 1;
    expect(checkStudy(study).findings).toContainEqual(
      expect.objectContaining({
        code: 'unknown-field',
        severity: 'warning',
        path: `$.cases[1].changes[${at}].set.kw`,
      }),
    );
  });

  it('is warned of once, at the element, where the element carries it too', () => {
    const study = looseStudy('1-detuned-400v');
    const drive = study.elements.find(({ id }) => id === 'drv')!;
    Object.assign(drive, { colour: 'red' });
    study.cases[1]!.changes.push({ element: 'drv', set: { colour: 'blue' } });
    const warned = checkStudy(study).findings.filter(({ code }) => code === 'unknown-field');
    expect(warned.map(({ path }) => path)).toEqual([`$.elements[${study.elements.indexOf(drive)}].colour`]);
  });

  it('in a step that a case brings is warned of', () => {
    const study = looseStudy('1-detuned-400v');
    study.cases[0]!.changes.push({ element: 'bank', set: { steps: [{ kvar: 50, rated: 1 }] } });
    expect(checkStudy(study).findings).toContainEqual(
      expect.objectContaining({ code: 'unknown-field', severity: 'warning' }),
    );
  });
});
