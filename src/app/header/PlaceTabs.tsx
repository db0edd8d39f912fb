import { type Place, useWorkbench } from '../../store/index.ts';

const places: readonly [Place, string][] = [
  ['site', 'Site'],
  ['correction', 'Correction'],
  ['sheet', 'Sheet'],
];

/** The three places of the workbench. */
export function PlaceTabs() {
  const place = useWorkbench((state) => state.view.place);
  const setPlace = useWorkbench((state) => state.setPlace);
  return (
    <nav className="places" aria-label="Places">
      {places.map(([id, words]) => (
        <button
          key={id}
          type="button"
          aria-current={place === id ? 'page' : undefined}
          onClick={() => setPlace(id)}
        >
          {words}
        </button>
      ))}
    </nav>
  );
}
