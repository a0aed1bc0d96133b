// Prints the published schema of study.json: `npm run schema`, kept in test-data/ohmstead-study.schema.json.
import { studyJsonSchema } from '@ohmstead/study';

process.stdout.write(`${JSON.stringify(studyJsonSchema(), null, 2)}\n`);
