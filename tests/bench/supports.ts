/** What supports and ties cost: the walk of a body of thirty courses and the figures that would be enough. */
import { supportEnough, supportsTogether, supportUnder } from '../../core/assess/supports.ts';
import { tiesTogether } from '../../core/assess/ties.ts';
import { addTie } from '../../core/job/edits.ts';
import type { Support } from '../../core/job/schema.ts';
import { thrustRange } from '../../core/statics/thrust.ts';
import { benchScheme, built } from './subjects.ts';
import { medianTime, table, timeInWords } from './timing.ts';

const buttress: Support = {
  kind: 'buttress',
  courses: Array.from({ length: 30 }, (_, i) => ({
    height: 0.1,
    ...(i === 0 ? { depth: 1.1 } : { setOffBack: 0.01 }),
  })),
  footing: { height: 0.4, projectionFront: 0.1, projectionBack: 0.2 },
  ground: { bearing: 300, friction: 0.5 },
};
const scheme = addTie({
  ...benchScheme({ shape: 'segmental', span: 4, rise: 1 }),
  supports: { left: { kind: 'rigid' }, right: buttress },
});
const untied = { ...scheme, ties: [] };
const ring = built(untied);
const range = thrustRange(ring.system);
if (!range.stands || range.least === null) throw new Error('the ring of the bench does not stand');
const { state } = range.least;

const tied = built(scheme);
const one = [{}];
console.log('\nSupports, a buttress of thirty courses on a footing');
console.log(
  table([
    ['question', 'median', 'asked for'],
    ['one line to the ground', timeInWords(medianTime(one, () => supportUnder(ring, 'right', state))), ''],
    [
      'full assessment of the support',
      timeInWords(medianTime(one, () => supportsTogether(ring, range, null))),
      'under 0.2 ms',
    ],
    [
      '  of support and tie',
      timeInWords(medianTime(one, () => supportsTogether(tied, range, tiesTogether(tied, range)))),
      '',
    ],
    [
      'depth, weight and footing that are enough',
      timeInWords(medianTime(one, () => supportEnough(ring, 'right'))),
      'under 2 ms',
    ],
  ]),
);
