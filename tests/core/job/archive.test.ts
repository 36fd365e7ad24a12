import { strFromU8, strToU8, unzipSync, zipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { readJobFile, writeJobFile } from '../../../core/job/archive.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import { problemSentence } from '../../../core/job/problem.ts';
import { writeJob } from '../../../core/job/write.ts';
import { checkSum } from '../../../core/job/zip-check.ts';
import { northDoor, northDoorText } from './job-text.ts';

const MEGABYTE = 1024 * 1024;

function refusal(bytes: Uint8Array): string {
  const reading = readJobFile(bytes);
  return reading.ok ? 'read' : reading.problems.map(problemSentence).join('\n');
}

/** A grey nothing of so many bytes, in the place of a photograph. */
function photograph(length: number, tone = 7): Uint8Array {
  return new Uint8Array(length).fill(tone);
}

const photographs = new Map([
  ['north face.jpg', photograph(1_000)],
  ['details/Schlußstein.jpg', photograph(500, 9)],
  ['2.jpg', photograph(3)],
]);

describe('an archive', () => {
  it('gives back the job and its photographs', () => {
    const reading = readJobFile(writeJobFile(freshJob(), photographs));
    expect(reading).toMatchObject({ ok: true, job: freshJob() });
    expect(reading.ok && new Map([...reading.photographs].sort())).toEqual(new Map([...photographs].sort()));
  });

  it('is the same bytes for the same content, in whatever order and wherever written', () => {
    const zone = process.env['TZ'];
    const turned = new Map([...photographs].reverse());
    process.env['TZ'] = 'Pacific/Kiritimati';
    const there = writeJobFile(freshJob(), turned);
    process.env['TZ'] = 'America/Los_Angeles';
    const here = writeJobFile(freshJob(), photographs);
    if (zone === undefined) delete process.env['TZ'];
    else process.env['TZ'] = zone;
    expect(there).toEqual(here);
  });

  it('holds job.json as its text is written', () => {
    const job = unzipSync(writeJobFile(freshJob(), photographs))['job.json']!;
    expect(new TextDecoder().decode(job)).toBe(writeJob(freshJob()));
  });

  it('does not take a photograph that could not be read back', () => {
    for (const name of ['job.json', '../north.jpg', '/north.jpg', '', 'a\\b.jpg', '__proto__']) {
      expect(() => writeJobFile(freshJob(), new Map([[name, photograph(1)]]))).toThrow(RangeError);
    }
  });

  it('may hold folders by themselves', () => {
    const bytes = zipSync({ 'details/': new Uint8Array(0), 'job.json': strToU8(northDoorText()) });
    expect(readJobFile(bytes)).toMatchObject({ ok: true, job: northDoor(), photographs: new Map() });
  });
});

describe('a bare job.json', () => {
  it('is read as one without photographs', () => {
    expect(readJobFile(strToU8(northDoorText()))).toEqual({ ok: true, job: northDoor(), photographs: new Map() });
    expect(readJobFile(strToU8(`\uFEFF${northDoorText({ title: 'Mühle' })}`))).toMatchObject({
      ok: true,
      job: { title: 'Mühle' },
    });
  });

  it('is in UTF-8', () => {
    const latin = Uint8Array.from(northDoorText({ title: 'M\u00fchle' }), (character) => character.charCodeAt(0));
    expect(refusal(latin)).toBe('neither an archive nor text in UTF-8; choose a .skewback file or a job.json');
    expect(refusal(new Uint8Array([0xff, 0xfe, 0x7b, 0]))).toBe('the text is in UTF-16; save it in UTF-8');
    expect(refusal(new Uint8Array([0x89, 0x50, 0x4e, 0x47]))).toMatch(/^neither an archive nor text in UTF-8/);
  });

  it('is not empty', () => {
    expect(refusal(new Uint8Array(0))).toBe('the file is empty; choose a file saved by Skewback');
  });

  it('has no 50 MB', () => {
    expect(refusal(new Uint8Array(50 * MEGABYTE))).toMatch(/^the job is too large to be one \(found 50 MB\)/);
  });
});

describe('an archive that cannot be read', () => {
  it('holds no job', () => {
    expect(refusal(zipSync({ 'old/job.json': strToU8(northDoorText()) }))).toBe(
      'the archive holds no job.json; choose a file saved by Skewback',
    );
    expect(refusal(zipSync({}))).toMatch(/^the archive holds no job.json/);
  });

  it('holds a job that is wrong, and says where', () => {
    expect(refusal(zipSync({ 'job.json': strToU8('{"format":') }))).toMatch(/^not JSON at line 1, column 11/);
  });

  it('is cut off', () => {
    const whole = writeJobFile(freshJob(), photographs);
    for (const length of [4, 30, 100, whole.length - 30, whole.length - 1]) {
      expect(refusal(whole.slice(0, length))).toBe('the archive is damaged or locked; take an earlier copy');
    }
  });

  it('has a photograph in which one bit has turned', () => {
    const bytes = writeJobFile(freshJob(), new Map([['north.jpg', photograph(1_000)]]));
    const at = bytes.findIndex((_, index) => bytes.subarray(index, index + 20).every((byte) => byte === 7));
    bytes[at + 100] = 6;
    expect(refusal(bytes)).toBe('a file in the archive is damaged (found "north.jpg"); take an earlier copy');
  });

  it('never yields other content than was written, whichever byte is spoilt', () => {
    const whole = writeJobFile(freshJob(), new Map([['2.jpg', photograph(20)]]));
    for (let at = 0; at < whole.length; at += 1) {
      const spoilt = whole.slice();
      spoilt[at]! ^= 0x10;
      const reading = readJobFile(spoilt);
      if (!reading.ok) continue;
      expect(reading.job).toEqual(freshJob());
      expect(
        [...reading.photographs.values()].every((bytes) => bytes.length === 20 && bytes.every((byte) => byte === 7)),
      ).toBe(true);
    }
  });

  it('unpacks to more than a job can be', () => {
    expect(refusal(zipSync({ 'job.json': new Uint8Array(40 * MEGABYTE) }))).toMatch(
      /^the job is too large to be one \(found 40 MB\)/,
    );
    expect(refusal(zipSync({ 'job.json': strToU8('{}'), 'a.jpg': new Uint8Array(65 * MEGABYTE) }))).toBe(
      'a file in the archive is too large (found "a.jpg"); each has at most 64 MB unpacked',
    );
  });

  it('says less than it unpacks to', () => {
    const bytes = zipSync({ 'job.json': strToU8('{}'), 'a.jpg': [new Uint8Array(2 * MEGABYTE), { level: 9 }] });
    const view = new DataView(bytes.buffer, bytes.byteOffset);
    for (let at = 0; at < bytes.length - 4; at += 1) {
      if (view.getUint32(at, true) === 2 * MEGABYTE) view.setUint32(at, 10, true);
    }
    expect(refusal(bytes)).toMatch(/damaged/);
  });

  it('holds thousands of files', () => {
    const files = Object.fromEntries(Array.from({ length: 2_001 }, (_, index) => [`${index}.jpg`, new Uint8Array(1)]));
    expect(refusal(zipSync(files))).toBe('the archive holds too many files; a job has at most 2000');
  });

  it.each(['../job.json', '/etc/passwd', 'C:\\a.jpg', 'a/../../b', '__proto__', 'a\u0000.jpg'])(
    'holds a file called %j',
    (name) => {
      // The packer would mend or mistake such names itself, so they are put into an archive already packed.
      const stand = '#'.repeat(name.length);
      expect(refusal(renamed(zipSync({ [stand]: strToU8('x') }), stand, name))).toMatch(
        /^the archive holds a file whose name is not allowed/,
      );
    },
  );
});

function renamed(archive: Uint8Array, from: string, to: string): Uint8Array {
  return strToU8(strFromU8(archive, true).replaceAll(from, to), true);
}

it('the check sum is the one of zip: CRC-32 of "123456789" is CBF43926 (catalogue of CRC parameters, from memory)', () => {
  expect(checkSum(strToU8('123456789'))).toBe(0xcbf43926);
});
