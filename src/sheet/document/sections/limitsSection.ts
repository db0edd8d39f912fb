import type { Source, Verdict } from '../../../checks/index.ts';
import { cells } from '../cells.ts';
import { byCheck, checkWords } from '../checkWords.ts';
import type { Section } from '../model.ts';
import { provenanceWords } from '../provenance.ts';
import type { SheetView } from '../SheetView.ts';

interface Used {
  source: Source;
  checks: string[];
}

function sourcesUsed(verdicts: readonly Verdict[]): Used[] {
  const used = new Map<string, Used>();
  for (const group of byCheck(verdicts)) {
    for (const { source } of group.verdicts) {
      const key = [source.document, source.edition ?? '', source.clause ?? '', source.provenance].join('|');
      const words = checkWords(group.check, group.verdicts);
      const entry = used.get(key) ?? { source, checks: [] };
      if (!entry.checks.includes(words)) entry.checks.push(words);
      used.set(key, entry);
    }
  }
  return [...used].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, entry]) => entry);
}

/** The documents whose limits judged, with edition, place and how well each is known. */
export function limitsSection(view: SheetView): Section {
  const used = sourcesUsed(view.verdicts);
  return {
    id: 'limits',
    title: 'Limits used',
    blocks: [
      used.length === 0
        ? { kind: 'paragraph', text: 'No limit was used: no check has been computed.' }
        : {
            kind: 'table',
            columns: [
              { head: 'document', align: 'left', grow: 1 },
              { head: 'edition', align: 'left' },
              { head: 'clause or table', align: 'left', grow: 2 },
              { head: 'how it is known', align: 'left', grow: 1 },
              { head: 'judges', align: 'left', grow: 2 },
            ],
            rows: used.map(({ source, checks }) =>
              cells(
                source.document,
                source.edition ?? 'not stated',
                source.clause ?? 'not stated',
                provenanceWords(source.provenance),
                checks.join(', '),
              ),
            ),
            notes: [
              'The edition in force at the site, the network operator’s rules and local code prevail over this list.',
            ],
          },
    ],
  };
}
