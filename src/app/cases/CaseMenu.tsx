import { useRef } from 'react';
import {
  Button,
  Keyboard,
  Menu,
  MenuItem,
  MenuSection,
  MenuTrigger,
  Popover,
  Separator,
  Text,
} from 'react-aria-components';
import { shownKeys } from '../../keys/index.ts';
import { useWorkbench } from '../../store/index.ts';
import { caseDifferences, casesOf, counted, nameOf, type Study } from '../../study/index.ts';
import type { Command } from '../commands/command.ts';
import { CaseForm } from './CaseForm.tsx';
import { closeCaseMenu, setCaseForm, useCaseForm } from './caseForms.ts';
import { NewCaseForm } from './NewCaseForm.tsx';
import { roleWords } from './roleWords.ts';
import { showNthCase } from './showNthCase.ts';
import './cases.css';

const actions = [
  ['case.next', 'case.previous', 'case.list', 'case.compare'],
  ['case.new', 'case.duplicate', 'case.form', 'case.up', 'case.down', 'case.remove'],
];

/** The case on screen, the way to another, and what can be done with it. */
export function CaseMenu({ commands }: { commands: readonly Command[] }) {
  const study = useWorkbench((state) => state.study);
  const caseId = useWorkbench((state) => state.view.caseId);
  const form = useCaseForm();
  const buttonRef = useRef<HTMLButtonElement>(null);
  if (!study) return null;
  const current = casesOf(study).find((one) => one.id === caseId);
  const close = () => setCaseForm(null);
  return (
    <div className="case-menu">
      <span className="quiet">Case</span>
      <MenuTrigger
        isOpen={form === 'menu'}
        onOpenChange={(open) => (open ? setCaseForm('menu') : closeCaseMenu())}
      >
        <Button ref={buttonRef} className="menu-button case-name">
          <span className="clipped">{current ? nameOf(current) : caseId}</span>{' '}
          <span aria-hidden="true">▾</span>
        </Button>
        <Popover className="popover">
          <CaseChoice study={study} caseId={caseId} commands={commands} />
        </Popover>
      </MenuTrigger>
      <Popover
        className="popover"
        triggerRef={buttonRef}
        placement="bottom start"
        isOpen={form === 'details' || form === 'new'}
        onOpenChange={(open) => !open && close()}
      >
        {form === 'new' ? (
          <NewCaseForm study={study} caseId={caseId} />
        ) : (
          <CaseForm study={study} caseId={caseId} onClose={close} />
        )}
      </Popover>
    </div>
  );
}

interface ChoiceProps {
  study: Study;
  caseId: string;
  commands: readonly Command[];
}

/** The cases by number, name and what differs; a digit shows its case at once. */
function CaseChoice({ study, caseId, commands }: ChoiceProps) {
  const setCase = useWorkbench((state) => state.setCase);
  const byId = new Map(commands.map((command) => [command.id, command]));
  const onDigit = (event: React.KeyboardEvent) => {
    if (!showNthCase(event)) return;
    event.preventDefault();
    event.stopPropagation();
    setCaseForm(null);
  };
  return (
    <div onKeyDownCapture={onDigit} role="presentation">
      <Menu aria-label="Cases" onAction={(id) => byId.get(String(id))?.run()}>
        <MenuSection
          aria-label="Show a case"
          selectionMode="single"
          selectedKeys={[caseId]}
          onSelectionChange={(keys) => {
            const [id] = [...keys];
            if (id !== undefined) setCase(String(id));
          }}
        >
          {casesOf(study).map((one, index) => (
            <MenuItem key={one.id} id={one.id} textValue={nameOf(one)}>
              <Text slot="label">
                <span className="case-digit">{index < 9 ? index + 1 : ''}</span>
                {nameOf(one)}
              </Text>
              <Text slot="description" className="quiet">
                {roleWords(one.role)}, {one.hoursPerDay} h a day{differenceWords(study, one.id)}
              </Text>
            </MenuItem>
          ))}
        </MenuSection>
        {actions.flatMap((group) => [
          <Separator key={group[0]} />,
          <MenuSection key={`${group[0]} section`} aria-label="Change the cases">
            {group.flatMap((id) => {
              const command = byId.get(id);
              if (!command) return [];
              return (
                <MenuItem key={id} id={id} textValue={command.words} isDisabled={command.enabled === false}>
                  <Text slot="label">{command.words}</Text>
                  {command.keys && <Keyboard>{shownKeys(command.keys)}</Keyboard>}
                </MenuItem>
              );
            })}
          </MenuSection>,
        ])}
      </Menu>
    </div>
  );
}

function differenceWords(study: Study, caseId: string): string {
  const { length } = caseDifferences(study, caseId);
  return length === 0 ? '' : ` · Δ ${counted(length, 'value')}`;
}
