import * as v from 'valibot';
import type { Questions } from '../preload/channels.ts';

const bytes = v.instance(Uint8Array);
const name = v.pipe(v.string(), v.maxLength(1_000));
const id = v.pipe(v.string(), v.maxLength(100));
const file = v.object({ id, name, folder: v.pipe(v.string(), v.maxLength(10_000)) });
const exported = v.object({ name, mime: name, bytes });
const nothing = v.strictTuple([]);

/**
 * The details that each question may come with. The types already say so; this holds where a page gone wrong says
 * something else.
 */
export const GUARDS = {
  'file:open': nothing,
  'file:save': v.strictTuple([id, bytes]),
  'file:save-as': v.strictTuple([name, bytes]),
  'file:export': v.strictTuple([exported]),
  'file:export-all': v.strictTuple([v.pipe(v.array(exported), v.minLength(1), v.maxLength(1_000))]),
  'recent:list': nothing,
  'recent:open': v.strictTuple([id]),
  'recent:forget': v.strictTuple([id]),
  'draft:keep': v.strictTuple([v.object({ id, title: name, file: v.nullable(file) }), bytes]),
  'draft:list': nothing,
  'draft:discard': v.strictTuple([id]),
  'page:print': nothing,
  'page:listens': nothing,
  'window:dirty': v.strictTuple([v.boolean()]),
  'window:title': v.strictTuple([name]),
  'window:close': nothing,
} satisfies { readonly [Channel in keyof Questions]: v.GenericSchema<unknown, Parameters<Questions[Channel]>> };
