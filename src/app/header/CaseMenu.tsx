import { Button, Menu, MenuItem, MenuTrigger, Popover } from 'react-aria-components';
import { useWorkbench } from '../../store/index.ts';
import { casesOf, nameOf } from '../../study/index.ts';

/** The case on screen, and the way to another. */
export function CaseMenu() {
  const study = useWorkbench((state) => state.study);
  const caseId = useWorkbench((state) => state.view.caseId);
  const setCase = useWorkbench((state) => state.setCase);
  if (!study) return null;
  const cases = casesOf(study);
  const current = cases.find((one) => one.id === caseId);
  return (
    <div className="case-menu">
      <span className="quiet">Case</span>
      <MenuTrigger>
        <Button className="menu-button">
          {current ? nameOf(current) : caseId} <span aria-hidden="true">▾</span>
        </Button>
        <Popover className="popover">
          <Menu
            aria-label="Cases"
            selectionMode="single"
            selectedKeys={[caseId]}
            onAction={(id) => setCase(String(id))}
          >
            {cases.map((one) => (
              <MenuItem key={one.id} id={one.id}>
                {nameOf(one)}
              </MenuItem>
            ))}
          </Menu>
        </Popover>
      </MenuTrigger>
    </div>
  );
}
