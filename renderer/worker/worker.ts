/** The thread beside the page, for questions that take longer than a frame. */
import { expose } from 'comlink';
import { longAnswers } from './answers.ts';

expose(longAnswers);
