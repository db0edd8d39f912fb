import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { BusSlip, PartSlip } from '../../../src/drawing/slip/index.ts';
import { elementById, fieldsOf, siteFindings } from '../../../src/study/index.ts';
import { exampleStudy, studyFiles } from '../../study/exampleStudies.ts';

const nothing = () => undefined;

function partMarkup(name: (typeof studyFiles)[number], id: string, caseId = 'base'): string {
  const study = exampleStudy(name);
  const element = elementById(study, id)!;
  return renderToStaticMarkup(
    <PartSlip
      element={element}
      study={study}
      caseId={caseId}
      findings={siteFindings(study)}
      onEdit={nothing}
      onRemove={nothing}
      onClose={nothing}
    />,
  );
}

describe('A data slip', () => {
  it('of every part of the example studies labels every field it shows, and every control has a name', () => {
    for (const name of studyFiles) {
      for (const { id, kind } of exampleStudy(name).elements) {
        const markup = partMarkup(name, id);
        for (const field of fieldsOf(kind)) {
          if (field.type === 'opaque' || field.type === 'group' || field.key === 'on' || field.key === 'name')
            continue;
          const target = new RegExp(`<label for="([^"]*-${field.key})"`).exec(markup)?.[1];
          expect(target, `${kind}.${field.key}`).toBeDefined();
          expect(markup, `${kind}.${field.key}`).toContain(` id="${target}"`);
        }
        const ids = [...markup.matchAll(/ id="([^"]+)"/g)].map((match) => match[1]);
        expect(new Set(ids).size, `${kind}: ids once`).toBe(ids.length);
      }
    }
  });

  it('shows defaults as placeholders and given values in trade formatting', () => {
    const markup = partMarkup('1-detuned-400v', 'press');
    expect(markup).toMatch(/placeholder="0\.94"[^>]*value=""/);
    expect(partMarkup('1-detuned-400v', 't1')).toContain('value="11\u2009000"');
  });

  it('in a variant case shows the case’s value and what the base study says', () => {
    const markup = partMarkup('1-detuned-400v', 'drv', 'night');
    expect(markup).toContain('change in Night only');
    expect(markup).toMatch(/value="30"/);
    expect(markup).toContain('base: 140 kW');
  });

  it('says at the field what is missing', () => {
    expect(partMarkup('1-detuned-400v', 'grid')).toContain('The minimum fault level is missing');
  });

  it('takes text from a file as text, never as markup', () => {
    const study = exampleStudy('1-detuned-400v');
    const bus = { ...study.buses[1]!, name: '<img src=x onerror=alert(1)>' };
    const markup = renderToStaticMarkup(
      <BusSlip
        bus={bus}
        study={{ ...study, buses: [study.buses[0]!, bus, study.buses[2]!] }}
        findings={[]}
        onEdit={nothing}
        onRemove={nothing}
        onClose={nothing}
      />,
    );
    expect(markup).not.toContain('<img');
    expect(markup).toContain('&lt;img');
  });
});
