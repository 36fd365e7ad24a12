/**
 * What must hold between fields and needs no geometry: names used once, the order of schemes, a rise that suits its
 * span. What needs the curve itself (a ring thicker than its radius, a load off the arch) is found in geometry and
 * loading.
 */
import { rightFor } from './fields.ts';
import { underPath } from './problem.ts';
import type { Problem } from './problem.ts';
import type { Above, Arch, Job, Load, Profile, Scheme } from './schema.ts';
import { shown } from './shown.ts';
import { supportProblems } from './support-relations.ts';

type Opening = NonNullable<Above['openings']>[number];

/** Names that the assessment gives to forces which come from no load. */
const RESERVED_LOAD_IDS = ['self-weight', 'above', 'sway'];

/** Problems between fields of a job that has passed the schema; empty when there are none. */
export function relationProblems(job: Job): Problem[] {
  return [
    ...underPath('site', dateProblems('surveyedOn', job.site?.surveyedOn)),
    ...repeatedIds('arches', job.arches),
    ...each('arches', job.arches, archProblems),
  ];
}

function archProblems(arch: Arch): Problem[] {
  return [
    ...repeatedIds('schemes', arch.schemes),
    ...arch.schemes.flatMap((scheme, index) =>
      underPath(`schemes[${index}]`, [...roleProblems(scheme, index), ...schemeProblems(scheme)]),
    ),
  ];
}

function schemeProblems(scheme: Scheme): Problem[] {
  const { profile, above, loads = [], combinations = [], cracks = [] } = scheme;
  return [
    ...profileProblems(profile),
    ...each('above.openings', above?.openings ?? [], openingProblems),
    ...underPath('supports.left', supportProblems(scheme.supports?.left)),
    ...underPath('supports.right', supportProblems(scheme.supports?.right)),
    ...repeatedIds('ties', scheme.ties ?? []),
    ...repeatedIds('loads', loads),
    ...each('loads', loads, loadProblems),
    ...repeatedIds('combinations', combinations),
    ...each('combinations', combinations, ({ factors = [] }) =>
      each('factors', factors, ({ load }) => unknownLoad(load, loads)),
    ),
    ...repeatedIds('cracks', cracks),
    ...each('cracks', cracks, ({ seenOn }) => dateProblems('seenOn', seenOn)),
  ];
}

/** The problems of every entry of a list, each under its place in it. */
function each<T>(list: string, entries: readonly T[], problemsOf: (entry: T) => Problem[]): Problem[] {
  return entries.flatMap((entry, index) => underPath(`${list}[${index}]`, problemsOf(entry)));
}

function roleProblems(scheme: Scheme, index: number): Problem[] {
  const { role } = scheme;
  const right = rightFor('role') ?? '';
  if (index === 0 && role === 'proposal') {
    return [{ path: 'role', value: shown(role), wrong: 'the first scheme is the arch as found', right }];
  }
  if (index > 0 && role === 'as-found') {
    return [{ path: 'role', value: shown(role), wrong: 'only the first scheme is the arch as found', right }];
  }
  return [];
}

function profileProblems(profile: Profile): Problem[] {
  if (profile.shape === 'segmental' && profile.rise > profile.span / 2) {
    return [
      {
        path: 'profile.rise',
        value: shown(profile.rise),
        wrong: 'the rise of a segmental arch is at most half its span',
        right: `give metres above 0 and up to ${profile.span / 2}, or choose the shape "horseshoe" or "pointed"`,
      },
    ];
  }
  if (profile.shape === 'pointed' && profile.rise < profile.span / 2) {
    return [
      {
        path: 'profile.rise',
        value: shown(profile.rise),
        wrong: 'the rise of a pointed arch is at least half its span',
        right: `give metres from ${profile.span / 2} on, or choose the shape "segmental"`,
      },
    ];
  }
  return [];
}

function loadProblems(load: Load): Problem[] {
  const problems: Problem[] = [];
  if (RESERVED_LOAD_IDS.includes(load.id)) {
    problems.push({
      path: 'id',
      value: shown(load.id),
      wrong: 'the assessment uses this name for forces of its own',
      right: 'choose another, such as "l1"',
    });
  }
  if (load.kind === 'strip')
    problems.push(...notAbove('to', load.to, load.from, 'a strip ends to the right of where it begins'));
  return problems;
}

function openingProblems({ from, to, sill, head }: Opening): Problem[] {
  return [
    ...notAbove('to', to, from, 'an opening ends to the right of where it begins'),
    ...notAbove('head', head, sill, 'the head of an opening is above its sill'),
  ];
}

function notAbove(path: string, value: number, limit: number, wrong: string): Problem[] {
  return value > limit ? [] : [{ path, value: shown(value), wrong, right: `give metres above ${limit}` }];
}

function unknownLoad(id: string, loads: readonly Load[]): Problem[] {
  if (loads.some((load) => load.id === id)) return [];
  const ids = loads.slice(0, 6).map((load) => shown(load.id));
  const right = ids.length === 0 ? 'add the load or take the factor out' : `write ${ids.join(' or ')}`;
  return [{ path: 'load', value: shown(id), wrong: 'no load of this scheme has this id', right }];
}

function repeatedIds(list: string, entries: readonly { readonly id: string }[]): Problem[] {
  const first = new Map<string, number>();
  return entries.flatMap(({ id }, index) => {
    const earlier = first.get(id);
    if (earlier === undefined) {
      first.set(id, index);
      return [];
    }
    const wrong = `already the id of ${list}[${earlier}]`;
    return [{ path: `${list}[${index}].id`, value: shown(id), wrong, right: rightFor('id') ?? '' }];
  });
}

/** An empty date is a date not entered. */
function dateProblems(field: string, date: string | undefined): Problem[] {
  if (date === undefined || date === '' || isDate(date)) return [];
  return [
    { path: field, value: shown(date), wrong: 'not a date of the calendar', right: rightFor('surveyedOn') ?? '' },
  ];
}

function isDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const day = new Date(`${text}T00:00:00Z`);
  return !Number.isNaN(day.getTime()) && day.toISOString().startsWith(text);
}
