import { mount } from 'svelte';
import App from './App.svelte';
import './app.css';
import { host } from './host/host.ts';
import { NO_PHOTOGRAPHS } from './session/document.ts';
import { BoardView } from './board/view.svelte.ts';
import { Questions } from './questions/questions.svelte.ts';
import { display } from './session/display.svelte.ts';
import { Schemes } from './schemes/schemes.svelte.ts';
import { Files } from './session/files.svelte.ts';
import { firstJob } from './session/samples.ts';
import { Session } from './session/session.svelte.ts';
import { theme } from './session/theme.svelte.ts';

theme.start();
display.start();
const session = new Session({ job: firstJob(), photographs: NO_PHOTOGRAPHS, file: null });
const questions = new Questions(session);
const schemes = new Schemes(session);
const view = new BoardView(session, schemes.over(questions));
mount(App, {
  target: document.querySelector('#app')!,
  props: { session, files: new Files(session, host), view, questions, schemes, host },
});
