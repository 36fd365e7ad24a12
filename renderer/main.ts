import { mount } from 'svelte';
import App from './App.svelte';
import './app.css';
import { browserHolding } from './host/holding.ts';
import { host } from './host/host.ts';
import { Autosave } from './session/autosave.svelte.ts';
import { NO_PHOTOGRAPHS } from './session/document.ts';
import { BoardView } from './board/view.svelte.ts';
import { Questions } from './questions/questions.svelte.ts';
import { display } from './session/display.svelte.ts';
import { Schemes } from './schemes/schemes.svelte.ts';
import { Dropping } from './session/dropping.svelte.ts';
import { Files } from './session/files.svelte.ts';
import { firstJob } from './session/samples.ts';
import { Session } from './session/session.svelte.ts';
import { theme } from './session/theme.svelte.ts';

theme.start();
display.start();
const session = new Session({ job: firstJob(), photographs: NO_PHOTOGRAPHS, file: null });
const files = new Files(session, host);
const tell = (text: string): void => {
  files.notice = { kind: 'problem', text, details: [] };
};
const questions = new Questions(session);
const autosave = host.drafts === undefined ? undefined : new Autosave(session, host.drafts, browserHolding, tell);
const schemes = new Schemes(session);
const view = new BoardView(session, schemes.over(questions));
const dropping = new Dropping(files, host);
mount(App, {
  target: document.querySelector('#app')!,
  props: { session, files, view, questions, schemes, host, autosave, dropping },
});

// After everything the person waits for: the page then works without its server too.
if (import.meta.env.PROD && host.shell === 'browser' && 'serviceWorker' in navigator)
  addEventListener('load', () => {
    navigator.serviceWorker.register('./offline.js', { updateViaCache: 'none' }).catch(() => undefined);
  });
