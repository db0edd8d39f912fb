import { type FormEvent, useCallback, useEffect, useState } from 'react';
import {
  archive,
  archiveNow,
  type KeptRevision,
  keepStateAs,
  useWorkbench,
  workbench,
} from '../../store/index.ts';
import { counted } from '../../study/index.ts';
import { Drawer } from './Drawer.tsx';
import { closeDrawer } from './fileDrawer.ts';
import { backToNow, goBackToIt, lookAt, useLooked } from './looking.ts';
import { dayWords, timeWords } from './momentWords.ts';

/** States made while the list is open are in it this long after. */
const refreshMs = 700;

type Listed = { revisions: readonly KeptRevision[]; problem: string | null } | null;

function useRevisions(): [Listed, () => void] {
  const documentId = useWorkbench((state) => state.documentId);
  const study = useWorkbench((state) => state.beforePreview ?? state.study);
  const [listed, setListed] = useState<Listed>(null);
  const load = useCallback(async () => {
    try {
      await archiveNow();
      setListed({ revisions: await archive.revisions(documentId), problem: null });
    } catch (error) {
      setListed({ revisions: [], problem: error instanceof Error ? error.message : String(error) });
    }
  }, [documentId]);
  useEffect(() => void load(), [load]);
  useEffect(() => {
    const timer = setTimeout(() => void load(), study ? refreshMs : 0);
    return () => clearTimeout(timer);
  }, [study, load]);
  return [listed, () => void load()];
}

function byDay(revisions: readonly KeptRevision[]): [string, KeptRevision[]][] {
  const days = new Map<string, KeptRevision[]>();
  for (const revision of revisions) {
    const day = dayWords(revision.at, Date.now());
    days.set(day, [...(days.get(day) ?? []), revision]);
  }
  return [...days];
}

/** The former states of the study: look at one on the drawing, go back to it, keep it under a name. */
export function EarlierStates() {
  const [listed, reload] = useRevisions();
  const title = useWorkbench((state) => state.study?.title ?? '');
  const looked = useLooked();
  useEffect(() => backToNow, []);
  return (
    <Drawer title={`Earlier states of ${title}`} onClose={closeDrawer}>
      <KeepAs onKept={reload} />
      <div className="drawer-body">
        {listed?.problem && (
          <p className="hint">
            Nothing can be kept in this browser: {listed.problem}. Save the study to a file.
          </p>
        )}
        {listed?.revisions.length === 0 && !listed.problem && (
          <p className="hint">No state yet: every edit adds one.</p>
        )}
        {listed &&
          byDay(listed.revisions).map(([day, revisions]) => (
            <section key={day} aria-label={day}>
              <h3>{day}</h3>
              <ul className="states">
                {revisions.map((revision) => (
                  <StateRow
                    key={revision.id}
                    revision={revision}
                    looked={looked?.id === revision.id}
                    onChanged={reload}
                  />
                ))}
              </ul>
            </section>
          ))}
      </div>
      <p className="drawer-foot">
        The last 50 stay, before them one for every ten minutes of a day, then one a day for 90 days; named
        ones for good. They stay in this browser alone.
      </p>
    </Drawer>
  );
}

interface RowProps {
  revision: KeptRevision;
  looked: boolean;
  onChanged(): void;
}

function StateRow({ revision, looked, onChanged }: RowProps) {
  const { id, at, words, name, parts, buses } = revision;
  const rename = async (next: string | null) => {
    await archive.nameRevision(id, next);
    onChanged();
  };
  return (
    <li>
      <button
        type="button"
        className="state"
        aria-pressed={looked}
        onClick={() => (looked ? backToNow() : void lookAt(revision))}
      >
        <span className="state-time">{timeWords(at)}</span>
        <span>
          {name && <strong>{name} · </strong>}
          {words}
          <span className="quiet">
            {' '}
            · {counted(parts, 'part')}, {counted(buses, 'busbar')}
          </span>
        </span>
      </button>
      {looked && (
        <div className="state-acts">
          <button type="button" onClick={goBackToIt}>
            Go back to this state
          </button>
          {name ? (
            <button type="button" onClick={() => void rename(null)}>
              Keep it no longer
            </button>
          ) : (
            <NameField
              label={`Name of the state of ${timeWords(at)}`}
              verb="Keep"
              onName={(text) => void rename(text)}
            />
          )}
        </div>
      )}
    </li>
  );
}

function KeepAs({ onKept }: { onKept(): void }) {
  const keep = async (name: string) => {
    try {
      await keepStateAs(name);
      onKept();
    } catch (error) {
      const reason = error instanceof Error ? error.message : String(error);
      const title = `The state could not be kept in this browser: ${reason}. Save the study to a file.`;
      workbench.getState().setNotice({ severity: 'warning', title, findings: [], offer: 'save' });
    }
  };
  return (
    <div className="keep-as">
      <NameField label="Keep the present state as" verb="Keep" visible onName={(name) => void keep(name)} />
    </div>
  );
}

interface NameProps {
  label: string;
  verb: string;
  visible?: boolean;
  onName(name: string): void;
}

function NameField({ label, verb, visible, onName }: NameProps) {
  const [text, setText] = useState('');
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const name = text.trim();
    if (name === '') return;
    setText('');
    onName(name);
  };
  return (
    <form className="name-field" onSubmit={submit}>
      <label>
        <span className={visible ? undefined : 'visually-hidden'}>{label}</span>
        <input
          type="text"
          value={text}
          placeholder="as found"
          maxLength={80}
          onChange={(event) => setText(event.target.value)}
        />
      </label>
      <button type="submit" disabled={text.trim() === ''}>
        {verb}
      </button>
    </form>
  );
}
