// Takes rows pasted from a spreadsheet into a list of the study, wherever in the list they are pasted.
import type { ComponentChildren, TargetedClipboardEvent, TargetedEvent, VNode } from 'preact';
import { useId, useState } from 'preact/hooks';
import type { PastedTable } from '../desk/desk.ts';
import { useDesk } from '../desk/use-desk.ts';

/** Cells apart or rows apart: a table, and not a number for the field it was pasted into. */
const TABLE = /[\t\n]/;

export interface PastingProps {
  readonly table: PastedTable;
  /** `layers`, with what their columns hold */
  readonly rows: string;
  readonly children: ComponentChildren;
}

/** The list itself where the sheet is frozen; in a live one also a place to paste to, and what is wrong with it. */
export function Pasting({ table, rows, children }: PastingProps): VNode {
  const desk = useDesk();
  const id = useId();
  const [complaints, setComplaints] = useState<readonly string[]>([]);
  if (desk === undefined) return <>{children}</>;
  const pasted = (event: TargetedClipboardEvent<HTMLElement>): void => {
    const text = event.clipboardData?.getData('text/plain').trim() ?? '';
    if (!TABLE.test(text)) return;
    event.preventDefault();
    setComplaints(desk.paste(table, text));
  };
  // rows typed by hand are taken when the field is left, and stay in it to be mended where they are refused
  const typed = (event: TargetedEvent<HTMLTextAreaElement>): void => {
    const field = event.currentTarget;
    if (field.value.trim() === '') return;
    const wrong = desk.paste(table, field.value);
    setComplaints(wrong);
    if (wrong.length === 0) field.value = '';
  };
  return (
    <div class="pasting" onPaste={pasted} onInput={() => setComplaints([])}>
      {children}
      <details class="fold">
        <summary>
          paste rows<span class="unseen"> of {table}</span>
        </summary>
        <div class="folded">
          <label for={id}>Paste or type here, or paste into any field above: {rows}.</label>
          <textarea id={id} rows={3} spellcheck={false} onChange={typed} />
        </div>
      </details>
      <div role="alert">
        {complaints.length > 0 && (
          <ul class="input-faults">
            {complaints.map((text) => (
              <li key={text}>{text}</li>
            ))}
          </ul>
        )}
      </div>
    </div>
  );
}
