// What the page lends to the sheet, from the state that it is in.
import type { Desk, PastedTable, StudyPath } from '@ohmstead/sheet';
import type { DisplayUnits, JsonValue } from '@ohmstead/study';
import { type Draft, valueAt } from '../desk/draft.ts';
import { setLabel } from '../desk/labels.ts';
import { complaintLine } from '../desk/paste-complaint.ts';
import { type Pasting, pasteCases, pasteLayers, pasteSeasons } from '../desk/paste-into.ts';
import { readQuantity } from '../desk/quantity.ts';
import { quantityText } from '../desk/quantity-text.ts';
import { setValue } from '../desk/set-value.ts';
import { type Bench, type BenchAction, draftOf, sectionState } from './bench.ts';
import { complaintsAt, faultsOfSection } from './section-faults.ts';

/** Slots that only the page can fill. */
export type Slots = Pick<Desk, 'instrument' | 'goTo' | 'note' | 'download'>;

/** Units in which the draft is shown. */
export function unitsOf(draft: Draft): DisplayUnits {
  return valueAt(draft, ['display_units']) === 'US' ? 'US' : 'SI';
}

function pasted(draft: Draft, table: PastedTable, text: string, units: DisplayUnits): Pasting {
  switch (table) {
    case 'layers':
      return pasteLayers(draft, ['soil', 'layers'], text, units);
    case 'cases':
      return pasteCases(draft, text, units);
    case 'seasons':
      return pasteSeasons(draft, text, units);
  }
}

export function deskOf(bench: Bench, act: (action: BenchAction) => void, slots: Slots): Desk {
  const draft = draftOf(bench);
  const units = unitsOf(draft);
  const { compared, pins, faults } = bench;
  return {
    ...slots,
    units,
    valueAt: (path: StudyPath) => valueAt(draft, path),
    edit: (path: StudyPath, value: JsonValue | undefined) =>
      act({
        kind: 'edit',
        draft: setValue(draft, path, value),
        label: setLabel(draft, path, value, units),
        field: JSON.stringify(path),
      }),
    read: (kind, text) => readQuantity(kind, text, { units }),
    show: (kind, value) => quantityText(kind, value, units),
    paste: (table, text) => {
      const result = pasted(draft, table, text, units);
      if (result.kind === 'complaints') return result.complaints.map(complaintLine);
      act({ kind: 'edit', draft: result.draft, label: `${table} pasted` });
      return [];
    },
    state: (section) => sectionState(bench, section),
    faults: (section) => faultsOfSection(faults, section),
    complaints: (path) => complaintsAt(faults, path),
    before: compared === undefined ? undefined : pins[compared]?.outcome,
  };
}
