// Conductors as tables: every cell is edited by keyboard where it stands, rows are deleted, and pasted from a spreadsheet.
import { type DisplayUnits, type Fault, faultLine, type RowOrigin } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useState } from 'preact/hooks';
import { type ConductorKey, conductorKeys } from '../desk/conductor.ts';
import { conductorsAt, deleteConductors, setCell } from '../desk/conductor-edits.ts';
import { type ConductorFile, cellText, conductorFile } from '../desk/conductor-file.ts';
import type { Draft } from '../desk/draft.ts';
import { conductorsLabel } from '../desk/labels.ts';
import { complaintLine } from '../desk/paste-complaint.ts';
import { pasteConductors } from '../desk/paste-into.ts';
import { listAt } from '../desk/set-value.ts';
import type { BenchAction } from './bench.ts';

export interface ConductorTablesProps {
  readonly draft: Draft;
  readonly units: DisplayUnits;
  readonly act: (action: BenchAction) => void;
  /** of the whole study */
  readonly faults: readonly Fault[];
  readonly selected: readonly RowOrigin[];
  readonly select: (rows: readonly RowOrigin[]) => void;
}

/** Rows shown before one asks for more. Reason: a page that still answers at once. */
const PAGE = 60;

export function ConductorTables(props: ConductorTablesProps): VNode {
  const paths = listAt(props.draft, ['conductors']).filter((path) => typeof path === 'string');
  return (
    <details class="conductors">
      <summary>Conductors as tables</summary>
      {paths.map((path) => (
        <OneTable key={path} path={path} {...props} />
      ))}
    </details>
  );
}

function OneTable({
  path,
  draft,
  units,
  act,
  faults,
  selected,
  select,
}: ConductorTablesProps & { readonly path: string }): VNode {
  const [shown, setShown] = useState(PAGE);
  const [complaints, setComplaints] = useState<readonly string[]>([]);
  const bytes = draft.files.get(path);
  const table = bytes === undefined ? undefined : conductorFile(bytes);
  if (table === undefined) return <p>{path} cannot be shown as a table of conductors.</p>;
  const keys = conductorKeys.filter((key) => table.columns.has(key));
  const rows = [...table.recordOnLine];
  const paste = (text: string): void => {
    const result = pasteConductors(draft, text, path, units);
    setComplaints(result.kind === 'complaints' ? result.complaints.map(complaintLine) : []);
    if (result.kind === 'draft') act({ kind: 'edit', draft: result.draft, label: `${path} pasted` });
  };
  const wrong = faults.filter(({ file }) => file === path);
  const chosen = selected.filter(({ file }) => file === path);
  return (
    <div>
      <div class="scroll">
        <table class="cells">
          <caption>
            {path}, {rows.length} {rows.length === 1 ? 'row' : 'rows'}
          </caption>
          <thead>
            <tr>
              <th scope="col">row</th>
              {keys.map((key) => (
                <th key={key} scope="col">
                  {headerText(table, key)}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.slice(0, shown).map(([line, record]) => {
              const isChosen = chosen.some((one) => one.line === line);
              return (
                <tr key={line} class={isChosen ? 'chosen' : ''}>
                  <th scope="row">
                    <label>
                      <input
                        type="checkbox"
                        checked={isChosen}
                        onChange={() =>
                          select(
                            isChosen
                              ? selected.filter((one) => one.file !== path || one.line !== line)
                              : [...selected, { file: path, line }],
                          )
                        }
                      />
                      {line}
                    </label>
                  </th>
                  {keys.map((key) => (
                    <td key={key}>
                      <Cell
                        label={`${headerText(table, key)}, row ${line}`}
                        text={cellText(table, record, key)}
                        wrong={wrong.some((one) => one.line === line && one.place === headerText(table, key))}
                        take={(text) =>
                          act({
                            kind: 'edit',
                            draft: setCell(draft, { file: path, line }, key, text),
                            label: `${key} in row ${line} of ${path} changed`,
                            field: `${path}:${line}:${key}`,
                          })
                        }
                      />
                    </td>
                  ))}
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
      {wrong.length > 0 && (
        <ul class="input-faults">
          {wrong.map((fault) => (
            <li key={faultLine(fault)}>{faultLine(fault)}</li>
          ))}
        </ul>
      )}
      <p class="edits">
        {rows.length > shown && (
          <button type="button" class="word" onClick={() => setShown(shown + PAGE)}>
            show {Math.min(PAGE, rows.length - shown)} more rows
          </button>
        )}
        {chosen.length > 0 && (
          <button
            type="button"
            class="word"
            onClick={() => {
              act({
                kind: 'edit',
                draft: deleteConductors(draft, chosen),
                label: conductorsLabel(conductorsAt(draft, chosen), 'deleted'),
              });
              select([]);
            }}
          >
            delete the rows chosen
          </button>
        )}
      </p>
      <label class="pasting">
        Paste rows from a spreadsheet to replace this table
        <textarea
          rows={2}
          value=""
          spellcheck={false}
          onPaste={(event) => {
            event.preventDefault();
            paste(event.clipboardData?.getData('text/plain') ?? '');
          }}
        />
      </label>
      {complaints.length > 0 && (
        <ul class="input-faults" role="alert">
          {complaints.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      )}
    </div>
  );
}

/** The name that the file gives a column, unit included. */
function headerText(table: ConductorFile, key: ConductorKey): string {
  const column = table.columns.get(key);
  return column === undefined ? key : (table.text.records[table.header]?.cells?.[column.index] ?? key);
}

interface CellProps {
  readonly label: string;
  readonly text: string;
  /** whether a fault of the study is about it */
  readonly wrong: boolean;
  readonly take: (text: string) => void;
}

function Cell({ label, text, wrong, take }: CellProps): VNode {
  return (
    <input
      class="cell"
      aria-label={label}
      value={text}
      aria-invalid={wrong}
      size={Math.max(4, text.length)}
      spellcheck={false}
      autocomplete="off"
      onChange={(event) => {
        if (event.currentTarget.value !== text) take(event.currentTarget.value);
      }}
      onKeyDown={(event) => {
        if (event.key === 'Escape') event.currentTarget.value = text;
      }}
    />
  );
}
