// The pieces sections are written with: statements, results in a sentence, folds, tables, figures.
import type { ComponentChildren, VNode } from 'preact';
import { Download } from '../field/download.tsx';
import { Kept } from './kept.tsx';

/** A statement: a sentence or a few, with folds at its end. Paragraphs cannot hold folds, so it is a division. */
export function Say({ children }: { children: ComponentChildren }): VNode {
  return <div class="say">{children}</div>;
}

/** A result in a sentence. */
export function Result({ children }: { children: ComponentChildren }): VNode {
  return <b class="res">{children}</b>;
}

/** Name of a case at the head of its sentence. */
export function CaseName({ name }: { name: string }): VNode {
  return <span class="case-name">{name}</span>;
}

/** What unfolds on demand; print shows it unfolded. `of` completes the label for those who hear or print it. */
export function Fold({
  label,
  of,
  children,
}: {
  label: string;
  of: string;
  children: ComponentChildren;
}): VNode {
  return (
    <details class="fold">
      <summary>
        {label}
        <span class="unseen">{of}</span>
      </summary>
      <div class="folded">{children}</div>
    </details>
  );
}

export interface TableColumn {
  readonly label: ComponentChildren;
  /** words to the left, numbers to the right */
  readonly align?: 'left' | 'right';
}

export interface DataTableProps {
  readonly caption: string;
  readonly columns: readonly TableColumn[];
  /** first cell of a row is its header */
  readonly rows: readonly (readonly ComponentChildren[])[];
  /** the table file that holds it, in full precision: `cases.csv` */
  readonly file?: string;
}

function side(column: TableColumn): string | undefined {
  return column.align === 'right' ? 'num' : undefined;
}

/** A table that scrolls within itself where it is wider than the page. */
export function DataTable({ caption, columns, rows, file }: DataTableProps): VNode {
  const table = (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a box that scrolls has to be reachable by keyboard
    <section class="scroll" aria-label={caption} tabIndex={0}>
      <table>
        <caption>{caption}</caption>
        <thead>
          <tr>
            {columns.map((column, k) => (
              <th key={k} scope="col" class={side(column)}>
                {column.label}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((cells, r) => (
            <tr key={r}>
              {cells.map((cell, k) =>
                k === 0 ? (
                  <th key={k} scope="row" class={side(columns[k])}>
                    {cell}
                  </th>
                ) : (
                  <td key={k} class={side(columns[k])}>
                    {cell}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
  return file === undefined ? (
    table
  ) : (
    <>
      {table}
      <Download file={file} />
    </>
  );
}

export interface FigureBlockProps {
  /** name of the drawing inside, which identifiers begin with */
  readonly name: string;
  readonly title: string;
  readonly caption: ComponentChildren;
  /** the same as a table */
  readonly table: ComponentChildren;
  /** what figure and table are drawn from: they stay while that is the same; undefined for what is alive itself */
  readonly by?: readonly unknown[];
  /** the figure's file; that of its name where undefined, none where null */
  readonly file?: string | null;
  readonly children: ComponentChildren;
}

/** A figure with its title, caption and the same content as a table. */
export function FigureBlock(props: FigureBlockProps): VNode {
  const { name, title, caption, table, by, file = `${name}.svg`, children } = props;
  const kept = (drawn: ComponentChildren): ComponentChildren =>
    by === undefined ? drawn : <Kept by={by}>{drawn}</Kept>;
  return (
    <div class="figure">
      <figure aria-labelledby={`${name}-heading`}>
        <h3 id={`${name}-heading`}>{title}</h3>
        {kept(children)}
        <figcaption>
          {caption}
          {file !== null && <Download file={file} />}
        </figcaption>
      </figure>
      <Fold label="as a table" of={`: ${title}`}>
        {kept(table)}
      </Fold>
    </div>
  );
}
