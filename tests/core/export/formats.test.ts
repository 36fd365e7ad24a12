import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { assessScheme } from '../../../core/assess/assess.ts';
import { exportFileStem, FORMATS, type ExportSubject } from '../../../core/export/formats.ts';
import { readJob } from '../../../core/job/read.ts';
import { faultsOf } from '../drawing/overlaps.ts';
import { elevationSheet } from '../../../core/drawing/elevation-sheet.ts';
import { SHEET_TITLE } from '../drawing/arches.ts';
import { elements, readXml, textOf } from './xml.ts';

const samples = new URL('../../../assets/samples/', import.meta.url);

function subjects(file: string): ExportSubject[] {
  const read = readJob(readFileSync(new URL(file, samples), 'utf8'));
  if (!read.ok) throw new Error(`${file} cannot be read`);
  const { job } = read;
  return job.arches.flatMap((arch) =>
    arch.schemes.map((scheme) => {
      const outcome = assessScheme(arch, scheme);
      if (!outcome.ok) throw new Error(`${file} cannot be assessed`);
      return { job, assessed: outcome.assessed };
    }),
  );
}

describe.each(readdirSync(samples).filter((name) => name.endsWith('.json')))('%s', (file) => {
  const [subject] = subjects(file);

  it('is drawn without lettering on lettering or beyond the frame', () => {
    for (const { assessed } of subjects(file)) expect(faultsOf(elevationSheet(assessed, SHEET_TITLE))).toEqual([]);
  });

  it('makes an SVG that says whose it is and when it was surveyed, and no date that was not given', () => {
    const svg = FORMATS.svg.make(subject!);
    const words = elements(readXml(svg), 'text').map(textOf);
    expect(words).toEqual(
      expect.arrayContaining([subject!.job.title, subject!.job.site?.reference, subject!.job.site?.surveyedOn]),
    );
    const dates = words.join(' ').match(/\b20\d\d-\d\d-\d\d\b/g);
    expect(dates).toEqual([subject!.job.site?.surveyedOn]);
    expect(FORMATS.svg.make(subject!)).toBe(svg);
  });

  it('prints what the office adds', () => {
    const svg = FORMATS.svg.make(subject!, {
      owner: 'Estate office',
      drawnBy: 'I. T.',
      issuedOn: '2026-06-01',
      paper: 'A2',
    });
    const words = elements(readXml(svg), 'text').map(textOf);
    expect(words).toEqual(expect.arrayContaining(['Estate office', 'I. T.', '2026-06-01']));
    expect(readXml(svg).attributes['width']).toBe('594mm');
  });
});

describe('file names', () => {
  const [subject] = subjects('harrowmere-mill-north-door.json');
  const stem = (name: string) =>
    exportFileStem({ ...subject!.assessed, result: { ...subject!.assessed.result, name } });
  it.each([
    ['North door / As found', 'north-door-as-found-elevation'],
    ['../../etc/passwd', 'etc-passwd-elevation'],
    ['Tür à côté', 'tur-a-cote-elevation'],
    ['橋', 'arch-elevation'],
    ['CON', 'con-elevation'],
  ])('makes %j into %j', (name, expected) => {
    expect(stem(name)).toBe(expected);
  });

  it('stay short', () => {
    expect(stem('x'.repeat(5000)).length).toBeLessThanOrEqual(80);
  });
});
