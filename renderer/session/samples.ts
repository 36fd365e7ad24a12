import { freshJob } from '../../core/job/fresh.ts';
import { readJob } from '../../core/job/read.ts';
import type { Job } from '../../core/job/schema.ts';

/** The sample jobs as text, in the order of their names. */
const TEXTS = import.meta.glob<string>('../../assets/samples/*.json', {
  query: '?raw',
  import: 'default',
  eager: true,
});

/** What the first start opens: a job with something to see, or a fresh one where the samples are not there. */
export function firstJob(): Job {
  for (const text of Object.values(TEXTS)) {
    const reading = readJob(text);
    if (reading.ok) return reading.job;
  }
  return freshJob('segmental');
}
