/** A thread that answers long questions; it is given up by ending it, since it hears nothing while it reckons. */
import { proxy, wrap } from 'comlink';
import type { Axle, AxleEnvelope } from '../../core/assess/long-questions.ts';
import type { Scheme } from '../../core/job/schema.ts';
import type { LongAnswers, Spread, Told } from './answers.ts';

export interface Desk {
  spread(scheme: Scheme, told: Told): Promise<Spread | null>;
  axle(scheme: Scheme, axle: Axle, told: Told): Promise<AxleEnvelope | null>;
  close(): void;
}

/** Starts the thread. */
export function openDesk(): Desk {
  const worker = new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' });
  const answers = wrap<LongAnswers>(worker);
  const broken = new Promise<never>((_, refuse) => {
    worker.addEventListener('error', () => refuse(new Error('the thread beside the page could not be started')));
  });
  broken.catch(() => undefined);
  return {
    spread: (scheme, told) => Promise.race([answers.spread(scheme, proxy(told)), broken]),
    axle: (scheme, axle, told) => Promise.race([answers.axle(scheme, axle, proxy(told)), broken]),
    close: () => worker.terminate(),
  };
}
