// Puts the live sheet on the page.
import { sheetCss } from '@ohmstead/sheet';
import { render } from 'preact';
import { App } from './app.tsx';
import './desk.css';

const style = document.createElement('style');
style.textContent = sheetCss;
document.head.append(style);

const root = document.getElementById('root');
if (root === null) throw new Error('the page has no place for the sheet');
render(<App />, root);
