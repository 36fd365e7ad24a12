import { parseArgs } from 'node:util';
import type { FormatId } from '../../core/export/formats.ts';
import { FORMAT_NAMES, isFormat } from './formats.ts';

export interface Options {
  readonly files: readonly string[];
  readonly json: boolean;
  readonly strict: boolean;
  /** Null: write no drawings. */
  readonly out: string | null;
  readonly formats: readonly FormatId[];
}

/** What was asked: to assess, to be told something, or something that cannot be done. */
export type Asked =
  | { readonly kind: 'assess'; readonly options: Options }
  | { readonly kind: 'tell'; readonly text: string }
  | { readonly kind: 'refused'; readonly reason: string };

export const USAGE = `npm run --silent assess -- FILE… [--json] [--out DIR] [--formats LIST] [--strict]

FILE        a .skewback file or a bare job.json; - reads standard input
--json      one assessment object per input on standard output, one a line
--out DIR   writes drawings and sheets there; the folder is made if need be
--formats   which of them, parted by commas: ${FORMAT_NAMES.join(', ')}; all of them when not given
--strict    exit status 1 when a check fails

Exit status: 0 assessed; 1 with --strict, when a check fails; 2 bad input or nothing written`;

/** Reads the arguments after the program's name. */
export function readOptions(args: readonly string[]): Asked {
  // Alone at the end, `--formats` asks which there are.
  if (args.at(-1) === '--formats') return { kind: 'tell', text: FORMAT_NAMES.join('\n') };
  let read;
  try {
    read = parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        json: { type: 'boolean', default: false },
        strict: { type: 'boolean', default: false },
        out: { type: 'string' },
        formats: { type: 'string', multiple: true },
        help: { type: 'boolean', short: 'h', default: false },
      },
    });
  } catch (error) {
    return refused(error instanceof Error ? (error.message.split('. ')[0] ?? '') : String(error));
  }
  const { values, positionals: files } = read;
  if (values.help) return { kind: 'tell', text: USAGE };
  if (files.length === 0) return refused('No file is given');
  if (files.filter((file) => file === '-').length > 1) return refused('Standard input (-) can be read only once');
  if (values.out === '') return refused('--out needs the name of a folder');
  const out = values.out ?? null;
  if (values.formats !== undefined && out === null)
    return refused('--formats chooses what --out DIR writes; give both');
  const names = (values.formats ?? [FORMAT_NAMES.join(',')]).flatMap((list) => list.split(','));
  const formats = [...new Set(names.map((name) => name.trim().toLowerCase()))];
  const unknown = formats.filter((name) => !isFormat(name));
  if (unknown.length > 0) {
    return refused(
      `--formats: there is no ${unknown.map((name) => `"${name}"`).join(', ')}; there is ${FORMAT_NAMES.join(', ')}`,
    );
  }
  const options = { files, json: values.json, strict: values.strict, out, formats: formats.filter(isFormat) };
  return { kind: 'assess', options };
}

const refused = (reason: string): Asked => ({ kind: 'refused', reason });
