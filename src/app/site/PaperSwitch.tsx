import type { ReactNode } from 'react';
import { setPanels } from '../panels/panelStore.ts';
import type { Panels } from '../panels/panels.ts';

type PaperView = NonNullable<Panels['paper']>;

const views: readonly (readonly [PaperView, string, string])[] = [
  ['drawing', 'as a drawing', ''],
  ['list', 'as a list', 'F10'],
  ['table', 'as a table', 'F7'],
];

interface Props {
  paper: PaperView;
  empty: boolean;
  /** What else can be done with what lies there. */
  children?: ReactNode;
}

/** What lies on the paper. An empty study has no list. */
export function PaperSwitch({ paper, empty, children }: Props) {
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
      {children}
    </fieldset>
  );
}
