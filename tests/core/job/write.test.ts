import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { freshJob } from '../../../core/job/fresh.ts';
import { readJob } from '../../../core/job/read.ts';
import type { Job } from '../../../core/job/schema.ts';
import { writeJob } from '../../../core/job/write.ts';
import { northDoor, northDoorText } from './job-text.ts';

function read(text: string): Job {
  const reading = readJob(text);
  if (!reading.ok) throw new Error(JSON.stringify(reading.problems));
  return reading.job;
}

/** The same job with one more field in every object, named by the caller. */
function withFieldEverywhere(value: unknown, name: string, extra: unknown): unknown {
  if (Array.isArray(value)) return value.map((entry) => withFieldEverywhere(entry, name, extra));
  if (typeof value !== 'object' || value === null) return value;
  const fields = Object.entries(value).map(([key, field]) => [key, withFieldEverywhere(field, name, extra)] as const);
  return Object.fromEntries([[name, extra], ...fields]);
}

/** Every object's fields the other way round. */
function reversed(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reversed);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, field]) => [key, reversed(field)]),
  );
}

describe('a job as written', () => {
  it('has two spaces a level, the order of the schema and a line break at the end', () => {
    expect(writeJob(read(northDoorText()))).toBe(`${northDoorText()}\n`);
  });

  it('is the same text whatever order its fields came in', () => {
    expect(writeJob(read(JSON.stringify(reversed(northDoor()))))).toBe(`${northDoorText()}\n`);
  });

  it('has a point on one line', () => {
    const points = [
      [-1, 0],
      [0, 0.4],
      [1, 0],
    ];
    const text = writeJob(read(northDoorText({ 'arches[0].schemes[0].profile': { shape: 'measured', points } })));
    expect(text).toContain('\n              [0, 0.4],\n');
  });

  it('of a fresh job has only what was chosen', () => {
    expect(writeJob(freshJob('segmental'))).toBe(`{
  "format": "skewback.job",
  "version": 1,
  "title": "New job",
  "arches": [
    {
      "id": "a1",
      "name": "Arch 1",
      "schemes": [
        {
          "id": "s1",
          "name": "As found",
          "role": "as-found",
          "profile": {
            "shape": "segmental",
            "span": 3,
            "rise": 0.75
          },
          "ring": {
            "thickness": 0.35
          },
          "breadth": 0.6
        }
      ]
    }
  ]
}
`);
  });
});

describe('unknown fields', () => {
  it('are kept at every level, behind the known ones and by the alphabet', () => {
    const job = withFieldEverywhere(
      withFieldEverywhere(northDoor(), 'zeal', { b: 1, a: [true, null] }),
      'amount',
      'as surveyed',
    );
    const text = writeJob(read(JSON.stringify(job)));
    expect(JSON.parse(text)).toEqual(job);
    // Job, site, arch, scheme, profile, ring, masonry, above, two loads, supports, left, right.
    expect(text.match(/"amount": "as surveyed",\n *"zeal": \{\n *"a": \[\n/g)).toHaveLength(13);
    expect(text).toContain('"notes": "",\n    "amount": "as surveyed"');
  });

  it('are kept under names that objects answer to', () => {
    const job = withFieldEverywhere(northDoor(), 'constructor', 'C. Hewer');
    expect(JSON.parse(writeJob(read(JSON.stringify(job))))).toEqual(job);
  });

  it('come back whatever they are, and writing again changes nothing', () => {
    const known = new Set(
      northDoorText()
        .match(/"\w+"(?=:)/g)
        ?.map((name) => name.slice(1, -1)),
    );
    const names = fc
      .string()
      .filter((name) => name !== '__proto__' && !known.has(name) && !['step', 'asked', 'haunchRadius'].includes(name));
    fc.assert(
      fc.property(names, fc.json({ depthSize: 'small' }), (name, extra) => {
        const job = withFieldEverywhere(
          northDoor(),
          name,
          JSON.parse(extra.replaceAll('__proto__', 'proto')) as unknown,
        );
        const text = writeJob(read(JSON.stringify(job)));
        expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(job)));
        expect(writeJob(read(text))).toBe(text);
        expect(read(writeJob(read(text)))).toEqual(read(text));
      }),
      { numRuns: 300 },
    );
  });
});
