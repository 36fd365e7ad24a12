import { describe, expect, test } from 'vitest';
import { freshJob } from '../../../core/job/fresh.ts';
import { setTitle } from '../../../core/job/edits.ts';
import {
  historyOf,
  presentOf,
  recorded,
  redone,
  stepToRedo,
  stepToUndo,
  undone,
} from '../../../renderer/session/history.ts';

const job = freshJob();
const titled = (title: string) => setTitle(job, title);

describe('undo', () => {
  test('goes back step by step to the very document that was opened, and forward again', () => {
    let history = historyOf(job);
    for (let n = 1; n <= 500; n++) history = recorded(history, `title ${n}`, titled(String(n)));
    for (let n = 500; n >= 1; n--) {
      expect(stepToUndo(history)).toBe(`title ${n}`);
      history = undone(history);
    }
    expect(presentOf(history)).toBe(job);
    expect(stepToUndo(history)).toBeNull();
    expect(stepToRedo(history)).toBe('title 1');
    expect(presentOf(redone(history)).title).toBe('1');
  });

  test('an edit after undo lets go of what was undone', () => {
    const undoneOnce = undone(recorded(recorded(historyOf(job), 'a', titled('a')), 'b', titled('b')));
    const history = recorded(undoneOnce, 'c', titled('c'));
    expect(stepToRedo(history)).toBeNull();
    expect(presentOf(undone(history)).title).toBe('a');
  });

  test('an edit that changes nothing makes no step', () => {
    const history = historyOf(job);
    expect(recorded(history, 'nothing', job)).toBe(history);
  });

  test('there is nothing before the first and nothing after the last', () => {
    const history = historyOf(job);
    expect(undone(history)).toBe(history);
    expect(redone(history)).toBe(history);
  });
});
