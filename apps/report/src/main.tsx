// Puts the live sheet on the page.
import { sheetCss } from '@ohmstead/sheet';
import { render } from 'preact';
import { blobWorker } from './engine/blob-worker.ts';
import type { EnginePlatform } from './engine/client.ts';
import { App } from './view/app.tsx';
import './view/page.css';

const style = document.createElement('style');
style.textContent = sheetCss;
document.head.append(style);

/** Read beside the page, so that the page is drawn first. */
const engineText: Promise<string> = import('./engine/text.ts').then((module) => module.engineText);
const begin: EnginePlatform['begin'] = (hear) => blobWorker(engineText, hear);

const root = document.getElementById('root');
if (root === null) throw new Error('the page has no place for the sheet');
render(<App begin={begin} />, root);
