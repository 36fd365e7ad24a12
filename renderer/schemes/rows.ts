/** The table of all schemes: what was changed, then every finding, one row each. The first scheme is what others are held against. */
import type { SchemeOutcome } from '../../core/assess/assess.ts';
import type { Check, SchemeAssessment, Status } from '../../core/assess/assessment.ts';
import type { Arch } from '../../core/job/schema.ts';
import { figure, safetyFigure } from '../../core/quantity/figures.ts';
import { changesBetween } from './changes.ts';

export interface ChangeRow {
  readonly path: string;
  readonly name: string;
  /** One for each scheme of the arch. */
  readonly cells: readonly { readonly text: string; readonly changed: boolean }[];
}

/** Each field that any proposal has changed. */
export function changeRows({ schemes }: Arch): ChangeRow[] {
  const [found] = schemes;
  if (found === undefined) return [];
  const changes = schemes.map((scheme, index) => (index === 0 ? [] : changesBetween(found, scheme, [0, index])));
  const rows = new Map(changes.flat().map((change) => [change.path, change]));
  return [...rows.values()].map(({ path, name, before }) => ({
    path,
    name,
    cells: changes.map((own) => {
      const change = own.find((one) => one.path === path);
      return { text: change?.after ?? before, changed: change !== undefined };
    }),
  }));
}

export interface FindingCell {
  readonly status: Status | null;
  readonly text: string;
  /** Against the first scheme, as in `+5 %`; empty where there is nothing to say. */
  readonly change: string;
}

export interface FindingRow {
  readonly id: string;
  readonly name: string;
  readonly cells: readonly FindingCell[];
}

interface Figure {
  readonly id: string;
  readonly name: string;
  readonly unit: string;
  readonly read: (result: SchemeAssessment) => number | null;
  /** What a missing figure means in a ring that stands. */
  readonly missing: string;
}

const FIGURES: readonly Figure[] = [
  {
    id: 'safety',
    name: 'Geometric safety',
    unit: '',
    read: ({ geometricSafety }) => geometricSafety,
    missing: 'the whole ring in hand',
  },
  {
    id: 'least',
    name: 'Least thrust',
    unit: 'kN',
    read: ({ thrust }) => thrust.least?.horizontal ?? null,
    missing: 'none',
  },
  {
    id: 'greatest',
    name: 'Greatest thrust',
    unit: 'kN',
    read: ({ thrust }) => thrust.greatest?.horizontal ?? null,
    missing: 'no limit',
  },
  {
    id: 'thinnest',
    name: 'Thinnest ring',
    unit: 'm',
    read: ({ thinnestRing }) => thinnestRing ?? null,
    missing: 'none found',
  },
  {
    id: 'sway',
    name: 'Sway that it bears',
    unit: 'g',
    read: ({ swayCapacity }) => swayCapacity ?? null,
    missing: 'no limit',
  },
];

const NO_CELL: FindingCell = { status: null, text: 'cannot be built', change: '' };

export function findingRows(outcomes: readonly SchemeOutcome[]): FindingRow[] {
  const results = outcomes.map((outcome) => (outcome.ok ? outcome.assessed.result : null));
  return [...checkRows(results), ...FIGURES.map((one) => figureRow(one, results)), ...loadRows(results)];
}

function checkRows(results: readonly (SchemeAssessment | null)[]): FindingRow[] {
  const names = new Map(results.flatMap((result) => result?.checks ?? []).map(({ id, title }) => [id, title]));
  return [...names].map(([id, name]) => ({
    id,
    name,
    cells: results.map((result) => {
      const check = result?.checks.find((one) => one.id === id);
      return check === undefined ? NO_CELL : { status: check.status, text: checkText(check), change: '' };
    }),
  }));
}

function checkText({ demand, limit, unit }: Check): string {
  if (demand === null || limit === null) return '';
  return `${figure(demand)} of ${figure(limit)} ${unit}`.trim();
}

function figureRow(
  { id, name, unit, read, missing }: Figure,
  results: readonly (SchemeAssessment | null)[],
): FindingRow {
  const first = results[0] ? read(results[0]) : null;
  return {
    id,
    name,
    cells: results.map((result, index) => {
      if (result === null) return NO_CELL;
      const value = read(result);
      if (value === null) return { status: null, text: result.thrust.stands ? missing : 'does not stand', change: '' };
      const text = id === 'safety' ? safetyFigure(value) : `${figure(value)} ${unit}`;
      return { status: null, text, change: index === 0 ? '' : changeOf(first, value) };
    }),
  };
}

/** How far each load can grow alone; by its name, since a copy keeps the ids. */
function loadRows(results: readonly (SchemeAssessment | null)[]): FindingRow[] {
  const ids = [...new Set(results.flatMap((result) => result?.loadFactors ?? []).map(({ load }) => load))];
  return ids.map((id) =>
    figureRow(
      {
        id: `load-${id}`,
        name: id,
        unit: 'times',
        read: ({ loadFactors }) => loadFactors?.find(({ load }) => load === id)?.factor ?? null,
        missing: 'no limit',
      },
      results,
    ),
  );
}

/** Differences under half a per cent are not told. */
const LEAST_TOLD = 0.005;
const MOST_TOLD = 10;

function changeOf(from: number | null, to: number): string {
  if (from === null || from === 0) return '';
  const share = (to - from) / Math.abs(from);
  if (Math.abs(share) < LEAST_TOLD || Math.abs(share) > MOST_TOLD) return '';
  return `${share > 0 ? '+' : '\u2212'}${figure(100 * Math.abs(share), 2)} %`;
}
