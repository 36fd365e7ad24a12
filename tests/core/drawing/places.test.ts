import { describe, expect, it } from 'vitest';
import { lettering } from '../../../core/drawing/path.ts';
import { apart, Places } from '../../../core/drawing/places.ts';

const square = (x: number, y: number, half = 1) => [
  { x: x - half, y: y - half },
  { x: x + half, y: y - half },
  { x: x + half, y: y + half },
  { x: x - half, y: y + half },
];

describe('figures apart', () => {
  it.each([
    ['side by side', square(0, 0), square(2.1, 0), 0.05, true],
    ['nearer than the clearance', square(0, 0), square(2.1, 0), 0.2, false],
    ['one within the other', square(0, 0), square(0, 0, 0.2), 0, false],
    [
      'a line past a corner',
      square(0, 0),
      [
        { x: 0, y: 2.1 },
        { x: 2.1, y: 0 },
      ],
      0,
      true,
    ],
    [
      'a line through',
      square(0, 0),
      [
        { x: -5, y: -4 },
        { x: 5, y: 4 },
      ],
      0,
      false,
    ],
    [
      'a line that ends before it',
      square(0, 0),
      [
        { x: -5, y: 0 },
        { x: -1.5, y: 0 },
      ],
      0.4,
      true,
    ],
    [
      'a turned square in the corner between',
      square(0, 0),
      [
        { x: 1.2, y: 2 },
        { x: 2, y: 1.2 },
        { x: 2.8, y: 2 },
        { x: 2, y: 2.8 },
      ],
      0.1,
      true,
    ],
  ])('%s', (_, a, b, clearance, expected) => {
    expect(apart(a, b, clearance)).toBe(expected);
    expect(apart(b, a, clearance)).toBe(expected);
  });
});

describe('places for lettering', () => {
  const at = (x: number, y: number) => [lettering('3.20', { x, y }, { align: 'middle' })];

  it('takes the first free place in order of preference', () => {
    const places = new Places(50);
    expect(places.place([at(0, 0), at(1, 0)])?.[0]?.at).toEqual({ x: 0, y: 0 });
    expect(places.place([at(0.05, 0), at(1, 0)])?.[0]?.at).toEqual({ x: 1, y: 0 });
    expect(places.place([at(0, 0.01), at(1, 0.01)])).toBeNull();
  });

  it('keeps off drawn arcs as well as lines', () => {
    const places = new Places(50);
    places.blockPath({
      kind: 'path',
      role: 'ring-edge',
      start: { x: 1, y: 0 },
      edges: [{ kind: 'arc', to: { x: -1, y: 0 }, centre: { x: 0, y: 0 }, radius: 1, from: 0, turn: Math.PI }],
      closed: false,
    });
    expect(places.place([at(Math.SQRT1_2, Math.SQRT1_2 - 0.02)])).toBeNull();
    expect(places.place([at(0, 0.2)])).not.toBeNull();
  });

  it('goes outwards with a leader when nothing near is free, and repeats itself exactly', () => {
    const crowd = (): Places => {
      const places = new Places(50);
      places.block(square(0, 0, 1));
      return places;
    };
    const placed = crowd().placeSurely([at(0, 0)], { x: 0, y: 0 });
    expect(placed.leader?.start).toEqual({ x: 0, y: 0 });
    expect(Math.hypot(placed.texts[0]!.at.x, placed.texts[0]!.at.y)).toBeGreaterThan(1);
    expect(crowd().placeSurely([at(0, 0)], { x: 0, y: 0 })).toEqual(placed);
  });
});
