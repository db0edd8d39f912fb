import type { SheetInput } from './input.ts';
import type { Section, SheetDocument } from './model.ts';
import { type SheetView, viewOf } from './SheetView.ts';
import { busbarsSection } from './sections/busbarsSection.ts';
import { casesSection } from './sections/casesSection.ts';
import { cautionsSection, FRONT_CAUTION } from './sections/cautionsSection.ts';
import { correctionSection } from './sections/correctionSection.ts';
import { dataSection } from './sections/dataSection.ts';
import { drawingSection } from './sections/drawingSection.ts';
import { frontImpedanceSection, marginsSection } from './sections/frontSections.ts';
import { harmonicsSection } from './sections/harmonicsSection.ts';
import { impedanceSection } from './sections/impedanceSection.ts';
import { limitsSection } from './sections/limitsSection.ts';
import { loadsSection } from './sections/loadsSection.ts';
import { openPointsSection } from './sections/openPointsSection.ts';
import { pinsSection } from './sections/pinsSection.ts';
import { resultSection } from './sections/resultSection.ts';
import { terminalsSection } from './sections/terminalsSection.ts';
import { verdictsSection } from './sections/verdictsSection.ts';

const day = (date: string | undefined): string | undefined => date?.match(/^\d{4}-\d{2}-\d{2}/)?.[0];

/** "study 7f3a-19c2" of a SHA-256 in hexadecimal. */
function shortened(fingerprint: string): string {
  return `study ${fingerprint.slice(0, 4)}-${fingerprint.slice(4, 8)}`;
}

function signOff(preparedBy: string): Section {
  return {
    id: 'sign-off',
    title: 'Sign-off',
    blocks: [
      {
        kind: 'signOff',
        fields: [
          { role: 'prepared', name: preparedBy },
          { role: 'checked', name: '' },
          { role: 'approved', name: '' },
        ],
      },
    ],
  };
}

function identity(input: SheetInput, revisionDate: string | undefined): Section {
  const { study } = input;
  return {
    id: 'identity',
    title: 'This document',
    blocks: [
      {
        kind: 'terms',
        terms: [
          { label: 'programme', text: `Varwright ${input.programmeVersion}` },
          { label: 'study fingerprint', text: `SHA-256 ${input.fingerprint}` },
          { label: 'revision', text: study.revision ?? 'not stated' },
          { label: 'revision date', text: revisionDate ?? 'not stated' },
        ],
      },
      {
        kind: 'paragraph',
        small: true,
        text: 'The same study gives the same sheet: the date is the revision’s and the fingerprint that of the study file without its view.',
      },
    ],
  };
}

/** Result, drawing, impedance and margins; a drawing on pages of its own comes after the other three. */
function frontPages(view: SheetView): Section[] {
  const drawing = drawingSection(view);
  const impedance = frontImpedanceSection(view);
  const rest = [...(impedance ? [impedance] : []), marginsSection(view)];
  return drawing.landscape
    ? [resultSection(view), ...rest, drawing]
    : [resultSection(view), { ...drawing, floatsPast: rest.length }, ...rest];
}

/**
 * The results sheet as data, from a study and what was computed for its cases. Pure and without a clock:
 * the same input gives the same document. A number that was not computed is named so with the reason.
 * Throws RangeError for a computed case the study does not have.
 */
export function buildDocument(input: SheetInput): SheetDocument {
  const view = viewOf(input);
  const { study } = input;
  const revisionDate = day(study.revisionDate);
  const site = study.site?.trim() || 'site not stated';
  const revision = study.revision?.trim() ? `revision ${study.revision.trim()}` : 'no revision stated';
  const preparedBy = study.preparedBy?.trim() ?? '';
  return {
    paper: input.paper,
    title: study.title,
    subtitle: [site, revision, ...(revisionDate ? [revisionDate] : [])].join(' · '),
    programme: `Varwright ${input.programmeVersion}`,
    fingerprint: input.fingerprint,
    shortFingerprint: shortened(input.fingerprint),
    ...(revisionDate ? { revisionDate } : {}),
    titleBlock: {
      site,
      preparedBy,
      checkedBy: '',
      approvedBy: '',
      revision: study.revision?.trim() ?? '',
    },
    frontCaution: FRONT_CAUTION,
    sections: [
      ...frontPages(view),
      dataSection(view),
      loadsSection(view),
      casesSection(view),
      correctionSection(view),
      busbarsSection(view),
      terminalsSection(view),
      impedanceSection(view),
      pinsSection(view),
      harmonicsSection(view),
      verdictsSection(view),
      openPointsSection(view),
      limitsSection(view),
      cautionsSection(view),
      identity(input, revisionDate),
      signOff(preparedBy),
    ],
  };
}
