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
import { useWorkbench } from '../../store/index.ts';
import { casesOf, nameOf } from '../../study/index.ts';
import { type Command, shownKeys } from '../commands/command.ts';
import { CaseForm } from './CaseForm.tsx';
import { roleWords } from './roleWords.ts';
import './cases.css';

interface Props {
  commands: readonly Command[];
  formOpen: boolean;
  onFormClose(): void;
}

const actions = ['case.new', 'case.duplicate', 'case.form', 'case.remove', 'case.next'];

/** The case on screen, the way to another, and what can be done with it. */
export function CaseMenu({ commands, formOpen, onFormClose }: Props) {
  const study = useWorkbench((state) => state.study);
  const caseId = useWorkbench((state) => state.view.caseId);
  const setCase = useWorkbench((state) => state.setCase);
  const buttonRef = useRef<HTMLButtonElement>(null);
  if (!study) return null;
  const cases = casesOf(study);
  const current = cases.find((one) => one.id === caseId);
  const byId = new Map(commands.map((command) => [command.id, command]));
  return (
    <div className="case-menu">
      <span className="quiet">Case</span>
      <MenuTrigger>
        <Button ref={buttonRef} className="menu-button case-name">
          <span className="clipped">{current ? nameOf(current) : caseId}</span>{' '}
          <span aria-hidden="true">▾</span>
        </Button>
        <Popover className="popover">
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
              {cases.map((one) => (
                <MenuItem key={one.id} id={one.id} textValue={nameOf(one)}>
                  <Text slot="label">{nameOf(one)}</Text>
                  <Text slot="description" className="quiet">
                    {roleWords(one.role)}, {one.hoursPerDay} h a day
                  </Text>
                </MenuItem>
              ))}
            </MenuSection>
            <Separator />
            <MenuSection aria-label="Change the cases">
              {actions.flatMap((id) => {
                const command = byId.get(id);
                if (!command) return [];
                return (
                  <MenuItem key={id} id={id} textValue={command.words} isDisabled={command.enabled === false}>
                    <Text slot="label">{command.words}</Text>
                    {command.keys && <Keyboard>{shownKeys(command.keys)}</Keyboard>}
                  </MenuItem>
                );
              })}
            </MenuSection>
          </Menu>
        </Popover>
      </MenuTrigger>
      <Popover
        className="popover"
        triggerRef={buttonRef}
        placement="bottom start"
        isOpen={formOpen}
        onOpenChange={(open) => !open && onFormClose()}
      >
        <CaseForm study={study} caseId={caseId} onClose={onFormClose} />
      </Popover>
    </div>
  );
}
