import { beforeEach, describe, expect, it } from 'vitest';
import { addCrack, setMasonry, setThickness } from '../../../core/job/edits.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import { Questions } from '../../../renderer/questions/questions.svelte.ts';
import { Session } from '../../../renderer/session/session.svelte.ts';
import type { Desk } from '../../../renderer/worker/desk.ts';

const NO_DESK: Desk = {
  spread: () => Promise.resolve(null),
  axle: () => Promise.resolve(null),
  close: () => undefined,
};

let session: Session;
let questions: Questions;

beforeEach(() => {
  session = new Session({ job: freshJob('segmental'), photographs: new Map(), file: null });
  questions = new Questions(session, () => NO_DESK);
});

describe('a chosen thrust', () => {
  it('lies between least and greatest, and its line is laid over the board', () => {
    const { least, greatest } = session.assessed!.result.thrust;
    questions.show('thrust');
    questions.thrust.share = 0.25;
    const expected = 0.75 * least!.horizontal! + 0.25 * greatest!.horizontal!;
    expect(questions.thrust.report?.horizontal).toBeCloseTo(expected, 6);
    expect(questions.overlays.chosen?.line).toHaveLength(session.assessed!.built.joints.length);
    questions.show('findings');
    expect(questions.overlays).toEqual({});
  });

  it('drawn by hand begins where it ran, and says where it leaves the ring', () => {
    questions.thrust.takeUpByHand();
    expect(questions.thrust.report?.outside).toEqual([]);
    questions.thrust.draw(1, -0.5);
    expect(questions.thrust.hand[1]).toBe(-0.5);
    const worst = questions.thrust.report!.outside.find(({ joint }) => joint === questions.thrust.handJoints[1]);
    expect(worst).toMatchObject({ side: 'intrados' });
    expect(worst?.by).toBeCloseTo(0.5 * session.scheme.ring.thickness, 6);
  });

  it('is held within what can be drawn, whatever the pointer does', () => {
    questions.thrust.draw(0, 90);
    expect(questions.thrust.hand[0]).toBe(1.75);
    questions.thrust.draw(0, Number.NaN);
    expect(questions.thrust.hand[0]).toBe(1.75);
  });

  it('is told joint by joint, the one pointed at on the board', () => {
    questions.show('thrust');
    const { intrados, extrados } = session.assessed!.ring.joints[4]!;
    const at = { x: (intrados.x + extrados.x) / 2, y: (intrados.y + extrados.y) / 2 };
    expect(questions.press(at, 0.05)).toBe(true);
    expect(questions.thrust.inspected?.joint).toBe(4);
    questions.thrust.inspect(900);
    expect(questions.thrust.inspected?.joint).toBe(questions.thrust.lastJoint);
  });

  it('of a ring that does not stand is none', () => {
    session.edit('thin', (scheme) => setThickness(scheme, 0.01));
    expect(session.assessed!.result.thrust.stands).toBe(false);
    expect(questions.thrust.report).toBeNull();
    questions.show('thrust');
    expect(questions.overlays).toEqual({});
  });
});

describe('a movement', () => {
  it('opens the joints of the least thrust when the springings part, with widths that grow in proportion', () => {
    questions.show('movement');
    const openings = () => {
      const { answer } = questions.moves;
      return answer?.kind === 'opens' ? answer.openings : [];
    };
    const ten = openings();
    expect(ten.map(({ joint, side }) => ({ joint, side }))).toEqual(session.assessed!.result.thrust.least!.hinges);
    questions.moves.distance = 0.02;
    expect(openings()[0]?.width).toBeCloseTo(2 * ten[0]!.width, 9);
    expect(questions.overlays.moved?.ring.openings[0]?.width).toBe(openings()[0]?.width);
  });

  it('of nothing opens nothing', () => {
    questions.moves.distance = 0;
    expect(questions.moves.answer).toBeNull();
    expect(questions.moves.ring).toBeNull();
  });

  it('of a ring that does not stand is how it falls, and can be wound by hand', () => {
    session.edit('thin', (scheme) => setThickness(scheme, 0.01));
    questions.show('movement');
    questions.fall.at = 0;
    expect(questions.overlays.moved?.ring.openings).toEqual([]);
    questions.fall.at = 1;
    expect(questions.overlays.moved?.ring.openings.length).toBeGreaterThan(2);
  });
});

describe('cracks', () => {
  const springingOutside = (): { x: number; y: number } => session.assessed!.ring.joints[0]!.extrados;

  it('are marked by a press near a joint, at the nearer face, and undone as one step', () => {
    questions.show('cracks');
    expect(questions.press(springingOutside(), 0.05)).toBe(false);
    questions.cracks.marking = true;
    expect(questions.press(springingOutside(), 0.05)).toBe(true);
    expect(session.scheme.cracks).toEqual([{ id: 'k1', joint: 0, face: 'extrados' }]);
    expect(questions.press({ x: 0, y: -3 }, 0.05)).toBe(false);
    expect(session.toUndo).toBe('crack at joint 0');
    session.undo();
    expect(session.scheme.cracks).toBeUndefined();
  });

  it('where the least thrust hinges speak for spreading, and its pattern can be seen', () => {
    questions.show('cracks');
    for (const { joint, side } of session.assessed!.result.thrust.least!.hinges) {
      const face = side === 'intrados' ? 'extrados' : 'intrados';
      session.edit('crack', (scheme) => addCrack(scheme, { joint, face }));
    }
    expect(questions.cracks.reading?.ranking[0]?.pattern.kind).toBe('spreading');
    questions.cracks.pointed = 'spreading';
    expect(questions.overlays.moved?.ring.openings).toHaveLength(3);
    questions.show('findings');
    questions.show('cracks');
    expect(questions.overlays).toEqual({});
  });

  it('are not read anew for every frame of a drag', () => {
    const before = questions.cracks.reading;
    const drag = session.drag();
    drag.preview((scheme) => setThickness(scheme, 0.4));
    expect(questions.cracks.reading).toBe(before);
    drag.release('thickness');
    expect(questions.cracks.reading).not.toBe(before);
  });
});

it('nothing said is ever no number, however little is known', () => {
  session.edit('stone', (scheme) => setMasonry(scheme, { unitWeight: 0, friction: null }));
  questions.show('thrust');
  const figures = (questions.thrust.report?.joints ?? []).flatMap(({ normal, shear, length }) => [
    normal,
    shear,
    length,
  ]);
  expect(figures.every(Number.isFinite)).toBe(true);
  expect(JSON.stringify(questions.thrust.report)).not.toContain('NaN');
});
