import { setPanels } from '../panels/panelStore.ts';
import type { Panels } from '../panels/panels.ts';

type PaperView = NonNullable<Panels['paper']>;

const views: readonly (readonly [PaperView, string, string])[] = [
  ['drawing', 'as a drawing', ''],
  ['list', 'as a list', 'F10'],
  ['table', 'as a table', 'F7'],
];

/** What lies on the paper. An empty study has no list. */
export function PaperSwitch({ paper, empty }: { paper: PaperView; empty: boolean }) {
  return (
    <fieldset className="paper-switch" aria-label="The site">
      {views
        .filter(([view]) => !empty || view !== 'list')
        .map(([view, words, key]) => (
          <button
            key={view}
            type="button"
            aria-pressed={view === paper}
            title={key}
            onClick={() => setPanels({ paper: view })}
          >
            {words}
          </button>
        ))}
    </fieldset>
  );
}
