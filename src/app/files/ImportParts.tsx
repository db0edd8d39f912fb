import { useEffect, useMemo, useState } from 'react';
import { useWorkbench, workbench } from '../../store/index.ts';
import {
  counted,
  formatQuantity,
  fullNameOf,
  importParts,
  nameOf,
  partsHangingFrom,
  type Study,
  withBelow,
} from '../../study/index.ts';
import { Drawer } from './Drawer.tsx';
import { closeDrawer } from './fileDrawer.ts';

const nothing: ReadonlySet<string> = new Set();

/** Parts of another study, chosen by busbar or one by one; the drawing shows where they would hang. */
export function ImportParts({ from }: { from: Study }) {
  const study = useWorkbench((state) => state.beforePreview ?? state.study);
  const focusBus = useWorkbench((state) => state.view.focusBus);
  const [chosen, setChosen] = useState(nothing);
  const [target, setTarget] = useState(focusBus);
  const bus = study?.buses.find(({ id }) => id === target)?.id ?? study?.buses[0]?.id ?? null;
  const edit = useMemo(
    () => (study && chosen.size > 0 ? importParts(study, from, [...chosen], bus) : null),
    [study, from, chosen, bus],
  );
  useEffect(() => {
    const { preview, cancelPreview } = workbench.getState();
    if (!edit) return;
    preview(edit);
    return cancelPreview;
  }, [edit]);
  if (!study) return null;
  const bring = () => {
    if (!edit) return;
    workbench.getState().edit(edit);
    workbench
      .getState()
      .select([...edit.elementIds.map((id) => `element:${id}`), ...edit.busIds.map((id) => `bus:${id}`)]);
    closeDrawer();
  };
  return (
    <Drawer title={`Bring parts from ${from.title}`} onClose={closeDrawer}>
      <div className="drawer-body">
        {from.buses.map(({ id, name, nominalV }) => (
          <Branch
            key={id}
            from={from}
            bus={{ id, name: name ?? id, nominalV }}
            chosen={chosen}
            onChosen={setChosen}
          />
        ))}
      </div>
      <div className="drawer-foot">
        {study.buses.length > 0 && (
          <label className="import-target">
            They will hang from{' '}
            <select value={bus ?? ''} onChange={(event) => setTarget(event.target.value)}>
              {study.buses.map((one) => (
                <option key={one.id} value={one.id}>
                  {nameOf(one)}, {formatQuantity(one.nominalV, 'V')}
                </option>
              ))}
            </select>
          </label>
        )}
        <p role="status">{edit ? summaryOf(edit) : 'Choose what to bring.'}</p>
        <button type="button" className="drawer-go" disabled={!edit} onClick={bring}>
          Bring them
        </button>
      </div>
    </Drawer>
  );
}

function summaryOf({ elementIds, busIds, remarks }: ReturnType<typeof importParts>): string {
  const what = [
    counted(elementIds.length, 'part'),
    ...(busIds.length > 0 ? [counted(busIds.length, 'busbar')] : []),
  ];
  return [`${what.join(' and ')}, as one step of undo`, ...remarks].map((words) => `${words}.`).join(' ');
}

interface BranchProps {
  from: Study;
  bus: { id: string; name: string; nominalV: number };
  chosen: ReadonlySet<string>;
  onChosen(chosen: ReadonlySet<string>): void;
}

/** A busbar with what hangs from it; sources are left out of "all", for the busbar here has its own. */
function Branch({ from, bus, chosen, onChosen }: BranchProps) {
  const parts = partsHangingFrom(from, bus.id);
  const below = useMemo(() => withBelow(from, [...chosen]).elements, [from, chosen]);
  const loads = parts.filter(({ kind }) => kind !== 'supply' && kind !== 'generator');
  const whole = loads.length > 0 && loads.every(({ id }) => below.has(id));
  const choose = (ids: readonly string[], on: boolean) => {
    const next = new Set(chosen);
    for (const id of ids)
      if (on) next.add(id);
      else next.delete(id);
    onChosen(next);
  };
  if (parts.length === 0) return null;
  return (
    <fieldset className="import-branch">
      <legend>
        <label>
          <input
            type="checkbox"
            checked={whole}
            disabled={loads.length === 0}
            onChange={(event) =>
              choose(
                loads.map(({ id }) => id),
                event.target.checked,
              )
            }
          />{' '}
          All that hangs from <strong>{bus.name}</strong>{' '}
          <span className="quiet">{formatQuantity(bus.nominalV, 'V')}</span>
        </label>
      </legend>
      {parts.map((part) => {
        const carried = below.has(part.id) && !chosen.has(part.id);
        const more = withBelow(from, [part.id]).elements.size - 1;
        return (
          <label key={part.id}>
            <input
              type="checkbox"
              checked={below.has(part.id)}
              disabled={carried}
              onChange={(event) => choose([part.id], event.target.checked)}
            />{' '}
            {fullNameOf(part)}
            {more > 0 && <span className="quiet"> with {counted(more, 'part')} below</span>}
          </label>
        );
      })}
    </fieldset>
  );
}
