import type { KeyboardEvent } from 'react';
import { ListBox, ListBoxItem, Text, useDragAndDrop } from 'react-aria-components';
import { useWorkbench, workbench } from '../../store/index.ts';
import {
  caseDifferences,
  casesOf,
  moveCase,
  nameOf,
  type ResolvedCase,
  removeCase,
  type Study,
} from '../../study/index.ts';
import { openCaseForm } from './caseForms.ts';
import { roleWords } from './roleWords.ts';
import { showNthCase } from './showNthCase.ts';

interface Props {
  study: Study;
  caseId: string;
}

/** Every case by its number; arrows show the next one at once, Alt and an arrow moves it, a drag does as well. */
export function CaseList({ study, caseId }: Props) {
  const cases = casesOf(study);
  const { dragAndDropHooks } = useDragAndDrop({
    getItems: (keys) => [...keys].map((key) => ({ 'text/plain': String(key) })),
    onReorder: ({ keys, target }) => {
      const [dragged] = keys;
      const from = cases.findIndex(({ id }) => id === dragged);
      const at = cases.findIndex(({ id }) => id === target.key) + (target.dropPosition === 'after' ? 1 : 0);
      const by = at > from ? at - 1 - from : at - from;
      if (dragged !== undefined && by !== 0) workbench.getState().edit(moveCase(study, String(dragged), by));
    },
  });
  const onKeyDown = (event: KeyboardEvent) => {
    const moves = event.altKey && (event.key === 'ArrowUp' || event.key === 'ArrowDown');
    const { edit } = workbench.getState();
    if (moves) edit(moveCase(study, caseId, event.key === 'ArrowUp' ? -1 : 1));
    else if (event.key === 'Delete' && cases.length > 1) edit(removeCase(study, caseId));
    else if (event.key === 'Enter') openCaseForm();
    else if (!showNthCase(event)) return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div onKeyDownCapture={onKeyDown} role="presentation">
      <ListBox
        aria-label="Cases; arrows show a case, Alt and an arrow moves it, Enter names it"
        className="case-list"
        autoFocus
        selectionMode="single"
        selectionBehavior="replace"
        disallowEmptySelection
        selectedKeys={[caseId]}
        onSelectionChange={(keys) => {
          const [id] = [...keys];
          if (id !== undefined) workbench.getState().setCase(String(id));
        }}
        dragAndDropHooks={dragAndDropHooks}
      >
        {cases.map((one, index) => (
          <ListBoxItem key={one.id} id={one.id} textValue={nameOf(one)} className="case-row">
            <CaseRow study={study} item={one} index={index} />
          </ListBoxItem>
        ))}
      </ListBox>
    </div>
  );
}

function CaseRow({ study, item, index }: { study: Study; item: ResolvedCase; index: number }) {
  const { length } = caseDifferences(study, item.id);
  return (
    <>
      <span className="case-digit">{index < 9 ? index + 1 : ''}</span>
      <Text slot="label">{nameOf(item)}</Text>
      <CaseFails id={item.id} />
      <Text slot="description" className="quiet">
        {roleWords(item.role)}, {item.hoursPerDay} h a day ·{' '}
        {length === 0 ? 'as the base study' : `Δ ${length} from base`}
      </Text>
    </>
  );
}

/** How many checks fail in the case, once it is judged. */
function CaseFails({ id }: { id: string }) {
  const fails = useWorkbench(({ allVerdicts, revision }) => {
    const verdicts = allVerdicts?.revision === revision ? allVerdicts.byCase[id] : undefined;
    return verdicts?.filter(({ verdict }) => verdict === 'fail').length ?? null;
  });
  if (fails === null) return <span className="case-fails quiet">…</span>;
  return (
    <span className="case-fails" data-some={fails > 0 ? '' : undefined}>
      {fails === 0 ? '0 fail' : `✕ ${fails} fail`}
    </span>
  );
}
