import { useMemo } from 'react';
import { Button, Menu, MenuItem, MenuTrigger, Popover, Text } from 'react-aria-components';
import { useWorkbench, workbench } from '../../store/index.ts';
import { type Finding, type Study, siteFindings } from '../../study/index.ts';
import { findingSubject } from './findingSubject.ts';
import './findings.css';

interface Props {
  /** For findings about the study as a whole. */
  onDetails(): void;
}

function jumpTo(study: Study, { path }: Finding, onDetails: () => void): void {
  const subject = findingSubject(study, path);
  const { setPlace, select, openSlip } = workbench.getState();
  if (subject) {
    setPlace('site');
    select([subject]);
    openSlip(subject);
  } else if (!path.startsWith('$.elements') && !path.startsWith('$.buses')) onDetails();
}

/** What is missing or odd about the site, counted quietly; each entry leads to its part. */
export function FindingsMenu({ onDetails }: Props) {
  const study = useWorkbench((state) => state.study);
  const findings = useMemo(() => (study ? siteFindings(study) : []), [study]);
  if (!study || findings.length === 0) return null;
  return (
    <MenuTrigger>
      <Button className="menu-button findings-count">
        {findings.length} {findings.length === 1 ? 'finding' : 'findings'} <span aria-hidden="true">▾</span>
      </Button>
      <Popover className="popover findings-list" placement="bottom end">
        <Menu
          aria-label="Findings"
          onAction={(key) => {
            const finding = findings[Number(key)];
            if (finding) jumpTo(study, finding, onDetails);
          }}
        >
          {findings.map((finding, index) => (
            <MenuItem key={`${finding.path} ${finding.code}`} id={String(index)} textValue={finding.message}>
              <Text slot="label">{finding.message}</Text>
            </MenuItem>
          ))}
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}
