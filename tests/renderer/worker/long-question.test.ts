import { expect, it } from 'vitest';
import { setThickness } from '../../../core/job/edits.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import type { Spread, Told } from '../../../renderer/worker/answers.ts';
import type { Desk } from '../../../renderer/worker/desk.ts';
import { LongQuestion } from '../../../renderer/worker/long-question.svelte.ts';
import { Session } from '../../../renderer/session/session.svelte.ts';

const SPREAD: Spread = { places: [], collapse: 0.1, furthest: 0.5 };

/** A thread whose answer comes when the test says so. */
function slowDesk() {
  const asked: { told: Told; answer: (spread: Spread) => void; fail: (error: Error) => void }[] = [];
  let closed = 0;
  const desk: Desk = {
    spread: (_, told) =>
      new Promise((answer, fail) => {
        asked.push({ told, answer, fail });
      }),
    axle: () => Promise.resolve(null),
    close: () => closed++,
  };
  return { desk, asked, closed: () => closed };
}

function question() {
  const session = new Session({ job: freshJob('segmental'), photographs: new Map(), file: null });
  const thread = slowDesk();
  const asked = new LongQuestion<void, Spread | null>(
    () => session.scheme,
    (desk, scheme, _, told) => desk.spread(scheme, told),
    () => thread.desk,
  );
  return { session, thread, asked };
}

const settled = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

it('a question tells how far it is, and then its answer', async () => {
  const { thread, asked } = question();
  void asked.ask();
  thread.asked[0]?.told(0.4);
  expect(asked.stage).toEqual({ kind: 'working', share: 0.4 });
  thread.asked[0]?.answer(SPREAD);
  await settled();
  expect(asked.answer).toBe(SPREAD);
});

it('a report that comes in after the answer does not take it away', async () => {
  const { thread, asked } = question();
  void asked.ask();
  thread.asked[0]?.answer(SPREAD);
  await settled();
  thread.asked[0]?.told(0.98);
  expect(asked.answer).toBe(SPREAD);
});

it('a question given up ends its thread, and what comes back is dropped', async () => {
  const { thread, asked } = question();
  void asked.ask();
  asked.cancel();
  expect(thread.closed()).toBe(1);
  thread.asked[0]?.answer(SPREAD);
  await settled();
  expect(asked.stage).toEqual({ kind: 'not-asked' });
});

it('asked again, only the newer answer counts', async () => {
  const { thread, asked } = question();
  void asked.ask();
  void asked.ask();
  thread.asked[0]?.answer({ ...SPREAD, collapse: 9 });
  thread.asked[1]?.answer(SPREAD);
  await settled();
  expect(asked.answer).toBe(SPREAD);
});

it('what keeps the thread from an answer is told, and the next asking starts another', async () => {
  const { thread, asked } = question();
  void asked.ask();
  thread.asked[0]?.fail(new Error('no thread to be had'));
  await settled();
  expect(asked.stage).toEqual({ kind: 'failed', because: 'no thread to be had' });
  void asked.ask();
  expect(asked.stage.kind).toBe('working');
  expect(thread.asked).toHaveLength(2);
});

it('an answer counts for the arch it was asked of: an edit puts it away, undo brings it back', async () => {
  const { session, thread, asked } = question();
  void asked.ask();
  thread.asked[0]?.answer(SPREAD);
  await settled();
  session.edit('thickness', (scheme) => setThickness(scheme, 0.5));
  expect(asked.answer).toBeNull();
  session.undo();
  expect(asked.answer).toBe(SPREAD);
});

it('a question under way is given up when the arch has changed', () => {
  const { session, thread, asked } = question();
  void asked.ask();
  session.edit('thickness', (scheme) => setThickness(scheme, 0.5));
  thread.asked[0]?.told(0.2);
  expect(thread.closed()).toBe(1);
  expect(asked.stage).toEqual({ kind: 'not-asked' });
});
