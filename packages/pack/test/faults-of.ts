// Runs something that must find faults in its input, and returns them as lines.
import { faultLine, InputFaults } from '@ohmstead/study';

export async function faultsOf(run: () => unknown): Promise<readonly string[]> {
  try {
    await run();
  } catch (error) {
    if (error instanceof InputFaults) return error.faults.map(faultLine);
    throw error;
  }
  throw new Error('expected faults of the input, found none');
}
