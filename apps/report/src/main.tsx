// Puts the live sheet on the page.
import type { PageScripts } from '@ohmstead/pack';
import { sheetCss } from '@ohmstead/sheet';
import { render } from 'preact';
import { blobWorker } from './engine/blob-worker.ts';
import type { EnginePlatform } from './engine/client.ts';
import { keepOffline } from './files/keep-offline.ts';
import { App } from './view/app.tsx';
import './view/page.css';

const style = document.createElement('style');
style.textContent = sheetCss;
document.head.append(style);

/** Read beside the page, so that the page is drawn first. */
const scripts: Promise<PageScripts> = import('./engine/page-scripts.ts').then((module) => module.pageScripts);
const begin: EnginePlatform['begin'] = (hear) => blobWorker(scripts, hear);

const root = document.getElementById('root');
if (root === null) throw new Error('the page has no place for the sheet');
render(<App begin={begin} />, root);
keepOffline();
