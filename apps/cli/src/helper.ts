// A helper thread of the program: does the tasks of a crew for the thread that started it.
import { parentPort } from 'node:worker_threads';
import { partWorks, workshop } from '@ohmstead/core';

if (parentPort === null) throw new Error('this file is run by ohmstead, as a thread of it');
const port = parentPort;
port.on(
  'message',
  workshop(partWorks(), (said, moved) => port.postMessage(said, [...moved])),
);
