// What a study still lacks before it can be computed, as questions that a page can ask one by one.
import { isList, isObject, items, type JsonValue, member } from '@ohmstead/study';
import type { Draft } from './draft.ts';
import type { JsonPath } from './path.ts';
import type { QuantityKind } from './quantity.ts';

/** How a question is answered: each answer is set at its path with `setValue`. */
export type Answer =
  | {
      readonly kind: 'quantity';
      readonly quantity: QuantityKind;
      readonly path: JsonPath;
      readonly words: string;
    }
  | {
      readonly kind: 'choice';
      readonly choices: readonly (string | number)[];
      readonly path: JsonPath;
      readonly words: string;
    }
  | { readonly kind: 'text'; readonly path: JsonPath; readonly words: string }
  /** a table that is opened beside the study */
  | { readonly kind: 'table'; readonly table: 'conductors' | 'survey'; readonly words: string };

export interface Question {
  readonly id: 'title' | 'conductors' | 'soil' | 'case' | 'current' | 'duration' | 'basis' | 'body-mass';
  /** in words, without a question mark */
  readonly ask: string;
  /** any one of them is enough */
  readonly answers: readonly Answer[];
}

function has(value: JsonValue | undefined, key: string): boolean {
  return member(value, key) !== undefined;
}

function soilQuestion(study: JsonValue): readonly Question[] {
  const soil = member(study, 'soil');
  if (has(soil, 'survey')) return [];
  if (items(soil, 'layers').some((layer) => has(layer, 'resistivity_ohm_m'))) return [];
  return [
    {
      id: 'soil',
      ask: 'the resistivity of the soil',
      answers: [
        {
          kind: 'quantity',
          quantity: 'resistivity',
          path: ['soil', 'layers', 0, 'resistivity_ohm_m'],
          words: 'soil resistivity, uniform for a start',
        },
        { kind: 'table', table: 'survey', words: 'readings of a four-pin survey' },
      ],
    },
  ];
}

function caseQuestions(study: JsonValue): readonly Question[] {
  const cases = member(study, 'cases');
  const list: readonly JsonValue[] = isList(cases) && cases.length > 0 ? cases : [{}];
  return list.flatMap((one, i): readonly Question[] => {
    if (!isObject(one)) return [];
    const name = member(one, 'name');
    const words = typeof name === 'string' && name !== '' ? ` of ${name}` : '';
    const quantity = (key: string, kind: QuantityKind, told: string): Answer => ({
      kind: 'quantity',
      quantity: kind,
      path: ['cases', i, key],
      words: told,
    });
    const questions: Question[] = [];
    if (!has(one, 'name')) {
      const answers: readonly Answer[] = [{ kind: 'text', path: ['cases', i, 'name'], words: 'case name' }];
      questions.push({ id: 'case', ask: 'the name of the fault case', answers });
    }
    if (!has(one, 'fault_current_A') && !has(one, 'grid_current_A')) {
      const answers = [
        quantity('grid_current_A', 'current', 'grid current, the part that enters the ground here'),
        quantity('fault_current_A', 'current', 'fault current, divided by a factor of its own'),
      ];
      questions.push({ id: 'current', ask: `the current${words}`, answers });
    }
    if (!has(one, 'duration_s')) {
      const answers = [quantity('duration_s', 'duration', 'fault duration')];
      questions.push({ id: 'duration', ask: `the duration${words}`, answers });
    }
    return questions;
  });
}

/**
 * What a study lacks, in the order of the sheet; what is there and wrong is told by the faults of loading it.
 * @returns no question where nothing is missing
 */
export function questionsOf({ study }: Draft): readonly Question[] {
  const questions: Question[] = [];
  if (!has(study, 'title')) {
    questions.push({
      id: 'title',
      ask: 'the title of the study',
      answers: [{ kind: 'text', path: ['title'], words: 'title' }],
    });
  }
  questions.push(...soilQuestion(study));
  if (items(study, 'conductors').length === 0) {
    questions.push({
      id: 'conductors',
      ask: 'the conductors of the electrode',
      answers: [{ kind: 'table', table: 'conductors', words: 'a table of conductors' }],
    });
  }
  questions.push(...caseQuestions(study));
  if (!has(member(study, 'limits'), 'basis')) {
    questions.push({
      id: 'basis',
      ask: 'the standard that the limits follow',
      answers: [
        { kind: 'choice', choices: ['IEEE 80'], path: ['limits', 'basis'], words: 'basis of the limits' },
      ],
    });
  }
  if (!has(member(study, 'limits'), 'body_mass_kg')) {
    questions.push({
      id: 'body-mass',
      ask: 'the body mass that the limits are stated for',
      answers: [
        { kind: 'choice', choices: [50, 70], path: ['limits', 'body_mass_kg'], words: 'body mass, kg' },
      ],
    });
  }
  return questions;
}
