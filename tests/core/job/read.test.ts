import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { problemSentence } from '../../../core/job/problem.ts';
import { readJob } from '../../../core/job/read.ts';
import { ABSENT, northDoor, northDoorText } from './job-text.ts';

/** The refusal as the person reads it, one sentence a line; `read` where there was none. */
function refusal(text: string): string {
  const reading = readJob(text);
  return reading.ok ? 'read' : reading.problems.map(problemSentence).join('\n');
}

const SCHEME = 'arches[0].schemes[0]';

describe('a job that is right', () => {
  it('is read as it was written', () => {
    const reading = readJob(northDoorText());
    expect(reading).toEqual({ ok: true, job: northDoor() });
  });

  it('may begin with a byte order mark', () => {
    expect(readJob(`\uFEFF${northDoorText()}`).ok).toBe(true);
  });

  it('needs no more than profile, thickness and breadth', () => {
    const scheme = { id: 's1', profile: { shape: 'semicircular', span: 3 }, ring: { thickness: 0.3 }, breadth: 1 };
    const job = { format: 'skewback.job', version: 1, arches: [{ id: 'a1', schemes: [scheme] }] };
    expect(readJob(JSON.stringify(job))).toEqual({ ok: true, job });
  });

  it('may say that strength and friction are not known', () => {
    expect(refusal(northDoorText({ [`${SCHEME}.masonry`]: { strength: null, friction: null } }))).toBe('read');
  });

  it('has no minus zero after reading, for there is no such measure', () => {
    const reading = readJob(northDoorText().replace('"sway": 0', '"sway": -0'));
    expect(reading.ok && Object.is(reading.job.arches[0]?.schemes[0]?.sway, 0)).toBe(true);
  });
});

describe('a file that is no job', () => {
  it.each([
    ['', 'the file is empty; choose a file saved by Skewback'],
    ['\uFEFF \n', 'the file is empty; choose a file saved by Skewback'],
    ['[]', 'not a job (found an empty list); a job is an object with "format": "skewback.job"'],
    ['null', 'not a job (found null); a job is an object with "format": "skewback.job"'],
    ['{}', 'format: missing, so this is not known to be a Skewback job; write "skewback.job"'],
    ['{"format":"survey"}', 'format: not a Skewback job (found "survey"); write "skewback.job"'],
    [
      '{"format":"skewback.assessment"}',
      'format: this is a result, not a job (found "skewback.assessment"); open the job that it came from',
    ],
  ])('%j', (text, sentence) => {
    expect(refusal(text)).toBe(sentence);
  });

  it.each([
    [ABSENT, 'version: missing; write 1'],
    ['1', 'version: not a version of the job file (found "1"); write 1'],
    [0, 'version: not a version of the job file (found 0); write 1'],
    [1.5, 'version: not a version of the job file (found 1.5); write 1'],
    [2, 'version: made by a newer Skewback: version 2, this one reads up to 1; open it with the newer one'],
  ])('nor one of version %s', (version, sentence) => {
    expect(refusal(northDoorText({ version }))).toBe(sentence);
  });

  it('is not looked through when it has 50 MB', () => {
    const started = performance.now();
    expect(refusal(' '.repeat(50 * 1024 * 1024))).toBe(
      'the job is too large to be one (found 50 MB); a job has at most 32 MB of text; keep photographs beside it in the archive',
    );
    expect(performance.now() - started).toBeLessThan(200);
  });

  it('nor when it holds millions of values', () => {
    const text = northDoorText({ [`${SCHEME}.name`]: 'COUNT' }).replace('"COUNT"', `[${'0,'.repeat(2_000_000)}0]`);
    expect(refusal(text)).toBe('the file holds too many values to be a job; a job holds at most 2000000');
  });

  it('nor when it is nested without end', () => {
    const deep = `${'['.repeat(100_000)}${']'.repeat(100_000)}`;
    expect(refusal(northDoorText().replace('"As found"', deep))).toMatch(
      /^arches\[0\]\.schemes\[0\]\.name(\[0\])+: nested too deeply; a job goes at most 32 levels deep$/,
    );
  });
});

describe('text that is not JSON', () => {
  const value = 'a value (text in double quotes, a number, true, false, null, a list or an object)';
  it.each([
    ['hello', `not JSON at line 1, column 1 (found "hello"); ${value} belongs there`],
    [
      '{"a": 1,}',
      'not JSON at line 1, column 9 (found "}"); a field name in double quotes (no comma before a closing bracket) belongs there',
    ],
    [
      '{"a": 1',
      'not JSON at line 1, column 8 (found the end of the file); a comma or the closing bracket belongs there',
    ],
    [
      '{\n  "rise": NaN\n}',
      'not JSON at line 2, column 11 (found NaN); a finite number, or null for what is not known, belongs there',
    ],
    [
      '{"rise":\r\n -Infinity}',
      'not JSON at line 2, column 2 (found -Infinity); a finite number, or null for what is not known, belongs there',
    ],
    [
      '{"rise": 0,8}',
      'not JSON at line 1, column 12 (found "8"); a field name in double quotes (no comma before a closing bracket) belongs there',
    ],
    [
      '{"rise": 0.8m}',
      'not JSON at line 1, column 10 (found 0.8m); a plain number with a decimal point and no unit, such as 0.35, belongs there',
    ],
    [
      "{'rise': 1}",
      `not JSON at line 1, column 2 (found "'"); a field name in double quotes or the closing } belongs there`,
    ],
    ['{"rise" 1}', 'not JSON at line 1, column 9 (found "1"); a colon after the field name belongs there'],
    [
      '{"a": "b\nc"}',
      'not JSON at line 1, column 9 (found a line break or control character); a closing double quote, or \\n for a line break, belongs there',
    ],
    ['{"a": "b}', 'not JSON at line 1, column 7 (found """); text with a closing double quote belongs there'],
    ['{"a": "\\q"}', 'not JSON at line 1, column 8 (found \\q); \\\\ for a backslash belongs there'],
    ['{} {}', 'not JSON at line 1, column 4 (found "{"); nothing more belongs there'],
    ['[1 2]', 'not JSON at line 1, column 4 (found "2"); a comma or the closing bracket belongs there'],
  ])('%j', (text, sentence) => {
    expect(refusal(text)).toBe(sentence);
  });

  it('is told by its place, wherever one character was spoilt', () => {
    const text = northDoorText();
    fc.assert(
      fc.property(
        fc.nat(text.length - 1),
        fc.constantFrom('#', '"', '}', ']', ',', ':', '\u0001', '\\'),
        (at, mark) => {
          const spoilt = `${text.slice(0, at)}${mark}${text.slice(at + 1)}`;
          const parses = isJson(spoilt);
          expect(refusal(spoilt).startsWith('not JSON at line')).toBe(!parses);
        },
      ),
      { numRuns: 500 },
    );
  });
});

function isJson(text: string): boolean {
  try {
    JSON.parse(text);
    return true;
  } catch {
    return false;
  }
}

describe('a field that is wrong is answered with its path, what was found and what would be right', () => {
  it.each<[Record<string, unknown>, string]>([
    [
      { 'profile.span': -3.2 },
      'profile.span: must be above 0 (found -3.2); give the clear width between the springings in metres, above 0 and up to 1000, such as 3.2',
    ],
    [{ 'profile.span': '3.2' }, 'profile.span: not a number (found "3.2"); write 3.2 without the quotes'],
    [
      { 'profile.span': 'wide' },
      'profile.span: not a number (found "wide"); give the clear width between the springings in metres, above 0 and up to 1000, such as 3.2',
    ],
    [
      { 'profile.rise': 1.7 },
      'profile.rise: the rise of a segmental arch is at most half its span (found 1.7); give metres above 0 and up to 1.6, or choose the shape "horseshoe" or "pointed"',
    ],
    [
      { profile: { shape: 'pointed', span: 3, rise: 1.4 } },
      'profile.rise: the rise of a pointed arch is at least half its span (found 1.4); give metres from 1.5 on, or choose the shape "segmental"',
    ],
    [
      { 'profile.shape': 'round' },
      'profile.shape: no shape that is known (found "round"); write "semicircular", "segmental", "pointed", "three-centred", "four-centred", "horseshoe", "elliptical", "parabolic", "catenary", "flat" or "measured"',
    ],
    [
      { 'ring.voussoirs': 1e9 },
      'ring.voussoirs: must be at most 100000 (found 1000000000); give a whole number from 2 to 100000, such as 21',
    ],
    [
      { 'ring.voussoirs': 20.5 },
      'ring.voussoirs: must be a whole number (found 20.5); give a whole number from 2 to 100000, such as 21',
    ],
    [
      { 'ring.joints': 'skew' },
      'ring.joints: not one of the words known here (found "skew"); write "radial" or "vertical"',
    ],
    [{ ring: ABSENT }, 'ring: missing; give an object with at least the thickness, such as { "thickness": 0.35 }'],
    [
      { breadth: null },
      'breadth: not a number (found null); give the breadth of the arch from face to face in metres, above 0 and up to 1000, such as 0.6',
    ],
    [
      { 'loads[0].kind': 'line' },
      'loads[0].kind: no kind that is known (found "line"); write "point", "strip" or "axle"',
    ],
    [
      { 'loads[0].force': ABSENT },
      'loads[0].force: missing; give kilonewtons on the whole breadth, + downwards, between −10000000 and 10000000, such as 12',
    ],
    [{ 'loads[0]': 12 }, 'loads[0]: not an object (found 12); give an object for each of the loads'],
    [
      { 'loads[1].to': -1 },
      'loads[1].to: a strip ends to the right of where it begins (found -1); give metres above -1',
    ],
    [
      { 'loads[1].id': 'l1' },
      'loads[1].id: already the id of loads[0] (found "l1"); give a short name of 1 to 200 characters, used once only',
    ],
    [
      { 'loads[0].id': 'self-weight' },
      'loads[0].id: the assessment uses this name for forces of its own (found "self-weight"); choose another, such as "l1"',
    ],
    [
      { role: 'proposal' },
      'role: the first scheme is the arch as found (found "proposal"); write "as-found" for the first scheme and "proposal" for the others, or leave it out',
    ],
    [{ profile: [] }, 'profile: a list where an object belongs (found an empty list); give an object in braces'],
    [
      {
        profile: {
          shape: 'measured',
          points: [
            [-1, 0],
            [0, 1, 2],
            [1, 0],
          ],
        },
      },
      'profile.points[1][2]: not a point (found 2); give each point as [x, y] in metres, between −1000 and 1000',
    ],
    [
      { 'masonry.strength': 0 },
      'masonry.strength: must be above 0 (found 0); give megapascals, above 0 and up to 1000, such as 5.8, or null when it is not known',
    ],
    [
      { 'supports.left': 'rigid' },
      'supports.left: not an object (found "rigid"); give an object such as { "kind": "rigid" }',
    ],
  ])('%o', (changes, sentence) => {
    const placed = Object.fromEntries(Object.entries(changes).map(([path, value]) => [`${SCHEME}.${path}`, value]));
    expect(refusal(northDoorText(placed))).toBe(`${SCHEME}.${sentence}`);
  });

  it.each<[Record<string, unknown>, string]>([
    [{ arches: [] }, 'arches: must hold at least 1 (found an empty list); give a list of 1 to 200 arches'],
    [{ site: [] }, 'site: a list where an object belongs (found an empty list); give an object in braces'],
    [
      { 'site.surveyedOn': '2026-02-30' },
      'site.surveyedOn: not a date of the calendar (found "2026-02-30"); give a date as year-month-day, such as 2026-05-14, or leave it out',
    ],
    [
      { 'site.surveyedOn': '14 May 2026' },
      'site.surveyedOn: not a date of the calendar (found "14 May 2026"); give a date as year-month-day, such as 2026-05-14, or leave it out',
    ],
    [
      { title: 'x'.repeat(20_001) },
      `title: longer than 20000 characters (found "${'x'.repeat(60)}…"); give text in double quotes, up to 20000 characters`,
    ],
    [
      { 'arches[0].id': '' },
      'arches[0].id: empty (found ""); give a short name of 1 to 200 characters, used once only',
    ],
    [
      {
        'arches[1]': {
          id: 'a1',
          schemes: [{ id: 's', profile: { shape: 'semicircular', span: 1 }, ring: { thickness: 1 }, breadth: 1 }],
        },
      },
      'arches[1].id: already the id of arches[0] (found "a1"); give a short name of 1 to 200 characters, used once only',
    ],
  ])('%o', (changes, sentence) => {
    expect(refusal(northDoorText(changes))).toBe(sentence);
  });

  it('an infinite number, which JSON writes as 1e999', () => {
    expect(refusal(northDoorText().replace('"span": 3.2', '"span": 1e999'))).toContain(
      'too large to be held as a number',
    );
  });

  it.each<[Record<string, unknown>, string]>([
    [
      { combinations: [{ id: 'c1' }, { id: 'c1' }] },
      'combinations[1].id: already the id of combinations[0] (found "c1"); give a short name of 1 to 200 characters, used once only',
    ],
    [
      { combinations: [{ id: 'c1', factors: [{ load: 'l9', factor: 1.5 }] }] },
      'combinations[0].factors[0].load: no load of this scheme has this id (found "l9"); write "l1" or "l2"',
    ],
    [
      { cracks: [{ id: 'k1', joint: 3, face: 'intrados', seenOn: '2026-13-01' }] },
      'cracks[0].seenOn: not a date of the calendar (found "2026-13-01"); give a date as year-month-day, such as 2026-05-14, or leave it out',
    ],
    [
      { 'above.openings': [{ from: 0.4, to: -0.4, sill: 2, head: 2 }] },
      'above.openings[0].to: an opening ends to the right of where it begins (found -0.4); give metres above 0.4\n' +
        `${SCHEME}.above.openings[0].head: the head of an opening is above its sill (found 2); give metres above 2`,
    ],
  ])('%o, which only other fields show to be wrong', (changes, sentence) => {
    const placed = Object.fromEntries(Object.entries(changes).map(([path, value]) => [`${SCHEME}.${path}`, value]));
    expect(refusal(northDoorText(placed))).toBe(`${SCHEME}.${sentence}`);
  });

  it('two schemes of one id, and an as-found that is not the first', () => {
    const [scheme] = (northDoor()['arches'] as { schemes: object[] }[])[0]!.schemes;
    expect(refusal(northDoorText({ 'arches[0].schemes[1]': scheme }))).toBe(
      'arches[0].schemes[1].id: already the id of schemes[0] (found "s1"); give a short name of 1 to 200 characters, used once only\n' +
        'arches[0].schemes[1].role: only the first scheme is the arch as found (found "as-found"); write "as-found" for the first scheme and "proposal" for the others, or leave it out',
    );
  });

  it('all of them at once, so that a file can be mended in one go', () => {
    const reading = readJob(northDoorText({ [`${SCHEME}.breadth`]: 'x', [`${SCHEME}.ring.thickness`]: 0, title: 3 }));
    expect(reading.ok ? [] : reading.problems.map(({ path }) => path)).toEqual([
      'title',
      `${SCHEME}.ring.thickness`,
      `${SCHEME}.breadth`,
    ]);
  });

  it('but not thousands of lines', () => {
    const points = Array.from({ length: 20_000 }, () => ['x', 'y']);
    const reading = readJob(northDoorText({ [`${SCHEME}.profile`]: { shape: 'measured', points } }));
    expect(reading.ok ? 0 : reading.problems.length).toBe(51);
    expect(reading.ok ? undefined : reading.problems.at(-1)?.wrong).toBe(
      '39950 more problems of this kind are not listed',
    );
  });

  it('a value that would break the line it is shown on', () => {
    expect(refusal(northDoorText({ [`${SCHEME}.breadth`]: 'a\nb\u202Ec' }))).toContain('(found "a b c")');
  });
});

describe('names that could reach a prototype', () => {
  it('are refused where they could, and harmless where they cannot', () => {
    const text = northDoorText().replace('"title":', '"__proto__": { "polluted": true }, "title":');
    expect(refusal(text)).toBe('__proto__: a field name that is not allowed; rename it or take it out');
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
    const kept = readJob(northDoorText({ constructor: 'kept', toString: 'kept' }));
    expect(kept).toMatchObject({ ok: true, job: { constructor: 'kept', toString: 'kept' } });
  });
});

it('reading never throws, whatever stands in the place of a field', () => {
  const paths = [
    'title',
    'site',
    'arches',
    'arches[0]',
    'arches[0].schemes',
    SCHEME,
    ...['profile', 'ring', 'loads', 'above', 'masonry', 'supports', 'sway', 'asked', 'id'].map(
      (field) => `${SCHEME}.${field}`,
    ),
  ];
  fc.assert(
    fc.property(fc.constantFrom(...paths), fc.jsonValue({ depthSize: 'small' }), (path, value) => {
      const reading = readJob(northDoorText({ [path]: value }));
      return reading.ok || reading.problems.every((problem) => problem.wrong !== '' && problem.right !== '');
    }),
    { numRuns: 1_000 },
  );
});
