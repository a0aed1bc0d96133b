// Whose work the sheet is, and its revisions: words of the engineer, shown where they are given.
import type { JsonValue, Study } from '@ohmstead/study';
import type { ComponentChildren, VNode } from 'preact';
import type { Desk, StudyPath } from '../desk/desk.ts';
import { itemsOf } from '../desk/json.ts';
import { listWithout } from '../desk/study-edits.ts';
import { TextInput } from '../field/inputs.tsx';
import { WordButton } from '../field/word-button.tsx';

const PROJECT_KEYS = ['client', 'site', 'number', 'prepared_by', 'checked_by'] as const;
type ProjectKey = (typeof PROJECT_KEYS)[number];
const REVISION_KEYS = ['mark', 'date', 'text', 'by'] as const;

function words(key: ProjectKey): string {
  return key.replace('_', ' ');
}

function ProjectList({
  entries,
}: {
  entries: readonly (readonly [string, ComponentChildren])[];
}): VNode | null {
  if (entries.length === 0) return null;
  return (
    <dl class="project">
      {entries.map(([name, told]) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>{told}</dd>
        </div>
      ))}
    </dl>
  );
}

function RevisionTable({ rows }: { rows: readonly (readonly ComponentChildren[])[] }): VNode | null {
  if (rows.length === 0) return null;
  return (
    <table class="revisions">
      <caption>Revisions</caption>
      <thead>
        <tr>
          {['mark', 'date', 'what changed', 'by'].map((label) => (
            <th key={label} scope="col">
              {label}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(([mark, ...rest], k) => (
          <tr key={k}>
            <th scope="row">{mark}</th>
            {rest.map((cell, c) => (
              <td key={c}>{cell}</td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** Project data and revisions of a frozen sheet; nothing where none are given. */
export function Project({ study }: { study: Study }): VNode {
  const { project, revisions = [] } = study;
  const entries = PROJECT_KEYS.flatMap((key): readonly (readonly [string, string])[] => {
    const told = project?.[key];
    return told === undefined ? [] : [[words(key), told]];
  });
  return (
    <>
      <ProjectList entries={entries} />
      <RevisionTable rows={revisions.map((one) => REVISION_KEYS.map((key) => one[key] ?? ''))} />
    </>
  );
}

const REVISIONS: StudyPath = ['revisions'];

function revisionFields(desk: Desk, stated: JsonValue | undefined, k: number): readonly ComponentChildren[] {
  const field = (key: (typeof REVISION_KEYS)[number]): VNode => (
    <TextInput
      key={key}
      path={[...REVISIONS, k, key]}
      label={`${key === 'text' ? 'what changed' : key} of revision ${k + 1}`}
      optional={key !== 'mark'}
    />
  );
  return [
    field('mark'),
    field('date'),
    field('text'),
    <span key="by">
      {field('by')}{' '}
      <WordButton
        press={() => desk.edit(REVISIONS, listWithout(stated, k))}
        of={`revision ${k + 1}`}
        vanishes
      >
        remove
      </WordButton>
    </span>,
  ];
}

/** The same as fields; folded away while nothing is given. */
export function ProjectFields({ desk }: { desk: Desk }): VNode {
  const stated = desk.valueAt(REVISIONS);
  const revisions = itemsOf(stated);
  const given = desk.valueAt(['project']) !== undefined || revisions.length > 0;
  return (
    <details class="fold" open={given}>
      <summary>project data and revisions</summary>
      <div class="folded">
        <ProjectList
          entries={PROJECT_KEYS.map((key) => [
            words(key),
            <TextInput key={key} path={['project', key]} label={words(key)} optional />,
          ])}
        />
        <RevisionTable rows={revisions.map((_, k) => revisionFields(desk, stated, k))} />
        <WordButton
          press={() => desk.edit(REVISIONS, [...revisions, { mark: String(revisions.length + 1) }])}
        >
          add a revision
        </WordButton>
      </div>
    </details>
  );
}
