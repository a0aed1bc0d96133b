// The demonstration study, carried in the page so that nothing has to be fetched.
import conductors from '../../../../test-data/aldermoor/conductors.csv?raw';
import study from '../../../../test-data/aldermoor/study.json?raw';

export function demoFiles(): Map<string, Uint8Array> {
  const encoder = new TextEncoder();
  return new Map([
    ['conductors.csv', encoder.encode(conductors)],
    ['study.json', encoder.encode(study)],
  ]);
}
