/** Job texts for the reading tests: the north door of Harrowmere Mill with one thing changed. */
export function northDoor(): Record<string, unknown> {
  return {
    format: 'skewback.job',
    version: 1,
    title: 'Harrowmere Mill, undercroft',
    site: { place: 'Harrowmere', reference: 'HM-03', surveyedBy: 'A. Quill', surveyedOn: '2026-05-14', notes: '' },
    arches: [
      {
        id: 'a1',
        name: 'North door',
        schemes: [
          {
            id: 's1',
            name: 'As found',
            role: 'as-found',
            profile: { shape: 'segmental', span: 3.2, rise: 0.8 },
            ring: { thickness: 0.35, voussoirs: 21, joints: 'radial' },
            breadth: 0.6,
            masonry: { name: 'squared sandstone', unitWeight: 22, strength: 5.8, friction: 0.6 },
            above: { kind: 'wall', height: 1.2, unitWeight: 21 },
            loads: [
              { id: 'l1', name: 'beam end', kind: 'point', x: 0.4, force: 12 },
              { id: 'l2', name: 'floor', kind: 'strip', from: -1, to: 0.5, intensity: 8 },
            ],
            sway: 0,
            supports: { left: { kind: 'rigid' }, right: { kind: 'rigid' } },
          },
        ],
      },
    ],
  };
}

/** Takes a field away. */
export const ABSENT = Symbol('absent');

/** The north door as JSON text, with the value at each path replaced; paths as in messages, `arches[0].id`. */
export function northDoorText(changes: Readonly<Record<string, unknown>> = {}): string {
  const job = northDoor();
  for (const [path, value] of Object.entries(changes)) {
    const keys = path.split(/[.[\]]+/).filter((key) => key !== '');
    const last = keys.pop() ?? '';
    const holder = keys.reduce<Record<string, unknown>>((at, key) => at[key] as Record<string, unknown>, job);
    if (value === ABSENT) Reflect.deleteProperty(holder, last);
    else holder[last] = value;
  }
  return JSON.stringify(job, null, 2);
}
