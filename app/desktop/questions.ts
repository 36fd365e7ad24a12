import type { IpcMain, IpcMainInvokeEvent } from 'electron';
import * as v from 'valibot';
import type { Answers } from './answers.ts';
import { GUARDS } from './guards.ts';

/**
 * Answers the page's questions, and nobody else's: only the main frame of our own page is heard, and only where the
 * details are of the right kind. The page sees a rejected promise otherwise.
 */
export function answerQuestions(ipc: Pick<IpcMain, 'handle'>, answers: Answers, pageOrigin: string): void {
  for (const channel of Object.keys(GUARDS) as (keyof typeof GUARDS)[]) {
    const guard: v.GenericSchema<unknown, unknown[]> = GUARDS[channel];
    const answer = answers[channel] as (...details: unknown[]) => Promise<unknown>;
    ipc.handle(channel, async (event, ...details: unknown[]) => {
      if (!isOurs(event, pageOrigin)) throw new Error('Only the program’s own page is answered.');
      const checked = v.safeParse(guard, details);
      if (!checked.success) throw new Error(`${channel} came with details of another kind.`);
      return await answer(...checked.output);
    });
  }
}

function isOurs({ senderFrame, sender }: IpcMainInvokeEvent, pageOrigin: string): boolean {
  return senderFrame !== null && senderFrame === sender.mainFrame && senderFrame.url.startsWith(`${pageOrigin}/`);
}
