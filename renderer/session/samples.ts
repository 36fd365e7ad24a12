import { freshJob } from '../../core/job/fresh.ts';
import { readJob } from '../../core/job/read.ts';
import type { Job } from '../../core/job/schema.ts';

/** The sample that is shown first: an arch that stands well. */
const FIRST = 'harrowmere-mill-north-door.json';

/** The sample jobs as text, by their paths. */
const TEXTS = import.meta.glob<string>('../../assets/samples/*.json', {
  query: '?raw',
  import: 'default',
  eager: true,
});

/** What the first start opens: a job with something to see, or a fresh one where the samples are not there. */
export function firstJob(): Job {
  const text = Object.entries(TEXTS).find(([path]) => path.endsWith(`/${FIRST}`))?.[1] ?? '';
  const reading = readJob(text);
  return reading.ok ? reading.job : freshJob('segmental');
}
