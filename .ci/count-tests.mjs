// Prints how many tests of a vitest JSON report passed, failed and were skipped: `P F S`.
import { readFileSync } from 'node:fs';

const report = JSON.parse(readFileSync(process.argv[2], 'utf8'));
const tests = report.testResults.flatMap(({ assertionResults }) => assertionResults);
const passed = tests.filter(({ status }) => status === 'passed').length;
const failed = tests.filter(({ status }) => status === 'failed').length;
// A file that cannot be loaded reports no test of its own, but must not pass unseen.
const broken = report.testResults.filter(
  (file) => file.status === 'failed' && file.assertionResults.length === 0,
);
if (tests.length === 0) throw new Error('the report lists no tests');
console.log(passed, failed + broken.length, tests.length - passed - failed);
