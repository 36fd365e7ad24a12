import { join, resolve } from 'node:path';
import { assessJobFully } from '../../core/assess/assess-fully.ts';
import type { Assessment } from '../../core/assess/assessment.ts';
import type { FormatId } from '../../core/export/formats.ts';
import { readJobFile } from '../../core/job/archive.ts';
import { problemSentence } from '../../core/job/problem.ts';
import type { Job } from '../../core/job/schema.ts';
import { readStreamWithin, readWithin } from '../files/read.ts';
import { saveWholeInFolder } from '../files/save.ts';
import { drawingsOf, type Drawing } from './formats.ts';
import { fileNames } from './names.ts';
import type { Options } from './options.ts';
import { summary } from './summary.ts';

/** The terminal, or what stands for it. */
export interface Terminal {
  /** File names are meant from here. */
  readonly folder: string;
  /** Standard input. */
  readonly input: AsyncIterable<unknown>;
  /** One line, or one text of several, on standard output. */
  readonly answer: (line: string) => void;
  /** One line on standard error. */
  readonly complain: (line: string) => void;
}

type Assessed =
  | { readonly ok: true; readonly job: Job; readonly assessment: Assessment }
  | { readonly ok: false; readonly problems: readonly string[] };

/**
 * Assesses every file, whatever becomes of the others.
 * @returns the exit status: 2 when a file could not be assessed or a drawing not written, else 1 when a check fails and
 * `strict` is asked for, else 0
 */
export async function assess(options: Options, terminal: Terminal): Promise<0 | 1 | 2> {
  const complain = (file: string, problem: string): void => terminal.complain(oneLine(`${file}: ${problem}`));
  const nameFor = fileNames();
  let somethingWrong = false;
  let aCheckFails = false;
  for (const file of options.files) {
    const assessed = await assessFile(file, terminal);
    if (!assessed.ok) {
      for (const problem of assessed.problems) complain(file, problem);
      somethingWrong = true;
      continue;
    }
    const { job, assessment } = assessed;
    aCheckFails ||= assessment.schemes.some((scheme) => scheme.checks.some((check) => check.status === 'fails'));
    terminal.answer(options.json ? JSON.stringify(assessment) : summary(file, assessment));
    if (options.out === null) continue;
    for (const drawing of drawn(job, options.formats)) {
      if (!drawing.ok) {
        complain(file, drawing.problem);
        somethingWrong = true;
        continue;
      }
      const path = join(options.out, nameFor(file, drawing.name));
      const saved = await saveWholeInFolder(resolve(terminal.folder, path), drawing.bytes);
      if (saved.kind === 'failed') {
        complain(path, `cannot be written: ${saved.because}; choose another folder for --out`);
        somethingWrong = true;
      } else if (!options.json) {
        terminal.answer(`  written: ${path}`);
      }
    }
  }
  if (somethingWrong) return 2;
  return options.strict && aCheckFails ? 1 : 0;
}

async function assessFile(file: string, { folder, input }: Terminal): Promise<Assessed> {
  const read = await (file === '-' ? readStreamWithin(input) : readWithin(resolve(folder, file)));
  if (read.kind === 'failed')
    return { ok: false, problems: [`cannot be read: ${read.because}; give a .skewback file or a job.json`] };
  try {
    const opened = readJobFile(read.value);
    if (!opened.ok) return { ok: false, problems: opened.problems.map(problemSentence) };
    const result = assessJobFully(opened.job);
    if (!result.ok) return { ok: false, problems: result.problems.map(problemSentence) };
    return { ok: true, job: opened.job, assessment: result.assessment };
  } catch (error) {
    // A mistake of the program's own must not cost the other files theirs.
    return { ok: false, problems: [`the program failed on this file: ${messageOf(error)}; report it with the file`] };
  }
}

type Drawn = ({ readonly ok: true } & Drawing) | { readonly ok: false; readonly problem: string };

function drawn(job: Job, formats: readonly FormatId[]): Drawn[] {
  return formats.flatMap((format): Drawn[] => {
    try {
      return drawingsOf(job, format).map((drawing) => ({ ok: true, ...drawing }));
    } catch (error) {
      return [
        { ok: false, problem: `${format} cannot be drawn: ${messageOf(error)}; leave ${format} out of --formats` },
      ];
    }
  });
}

const messageOf = (error: unknown): string => (error instanceof Error ? error.message : String(error));

/** A problem quotes what stood in the file; whatever that was, it makes one line. */
const oneLine = (text: string): string => text.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').trim();
