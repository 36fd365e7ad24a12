/** Quiet lettering on the elevation: joint numbers and what the wall or fill is. Left out where there is no room. */
import { drawnLayers } from './above.ts';
import { hingedJoints, put, type Draught } from './draught.ts';
import { entered } from './entered.ts';
import { along, lettering } from './path.ts';
import type { Placing } from './places.ts';
import { CAPITAL_HEIGHT, cutToWidth, plainText, textWidth } from './text.ts';

/** Paper mm. */
const LETTERS = 1.8;
const FROM_FACE = 2.4;

export function drawNotes(draught: Draught): void {
  if (draught.moved === null) drawBreadth(draught);
  drawLayerNames(draught);
  drawAboveNote(draught);
  drawBackingNote(draught);
  drawJointNumbers(draught);
}

/** Under the span's figure: the one measure that an elevation cannot show. */
function drawBreadth(draught: Draught): void {
  const { ring, resolved, mm, places, length } = draught;
  const left = ring.joints[0]!.intrados;
  const right = ring.joints.at(-1)!.intrados;
  const at = { x: (left.x + right.x) / 2, y: Math.min(left.y, right.y) - mm(15.5) };
  const text = lettering(`breadth ${length(resolved.breadth)}`, at, {
    align: 'middle',
    about: { kind: 'field', path: 'breadth' },
  });
  const placed = places.placeSurely([[text]], at);
  put(draught, 'dimensions', ...placed.texts);
}

function drawAboveNote(draught: Draught): void {
  const { resolved, top } = draught;
  const { kind, unitWeight, openings } = resolved.above;
  if (kind === 'none') return;
  const words = `${kind} above, ${entered(unitWeight)} kN/m³`;
  noteInside(draught, words);
  const hidden = openings.filter(({ sill }) => sill >= top.level).length;
  if (hidden > 0) noteInside(draught, `${hidden} ${hidden === 1 ? 'opening' : 'openings'} higher up`);
}

/** At either edge of what lies above, as high as there is room. */
function noteInside(draught: Draught, words: string): void {
  const { sky, top, mm, places } = draught;
  const width = mm(textWidth(words, 2.5) + 4);
  if (width > sky.right.x - sky.left.x) return;
  const placings: Placing[] = [];
  for (const down of [4.5, 9, 14, 20, 28, 38]) {
    const y = top.level - mm(down);
    placings.push([lettering(words, { x: sky.left.x + mm(2), y }, { role: 'text-quiet' })]);
    placings.push([lettering(words, { x: sky.right.x - mm(2), y }, { role: 'text-quiet', align: 'end' })]);
  }
  put(draught, 'notes', ...(places.place(placings) ?? []));
}

/** Each layer's name and thickness inside it, or beside its end; left out where neither has room. */
function drawLayerNames(draught: Draught): void {
  const { resolved, sky, mm, places, length } = draught;
  if (resolved.above.kind === 'none') return;
  for (const { index, bottom, top } of drawnLayers(draught)) {
    const { name, thickness } = resolved.above.layers[index]!;
    const words = `${cutToWidth(plainText(name ?? 'layer'), LONGEST_LAYER_NAME, LETTERS)} ${length(thickness)}`;
    const about = { kind: 'field', path: `above.layers[${index}].thickness` } as const;
    const y = (bottom + top) / 2 - mm(LETTERS / 2);
    const how = { height: LETTERS, role: 'text-quiet', about } as const;
    put(
      draught,
      'notes',
      ...(places.place([
        [lettering(words, { x: sky.left.x + mm(2), y }, how)],
        [lettering(words, { x: sky.right.x - mm(2), y }, { ...how, align: 'end' })],
        [lettering(words, { x: sky.right.x + mm(1.5), y }, how)],
        [lettering(words, { x: sky.left.x - mm(1.5), y }, { ...how, align: 'end' })],
      ]) ?? []),
    );
  }
}

/** Paper mm. */
const LONGEST_LAYER_NAME = 50;

/** What the backing is taken for, beside it or over it. */
function drawBackingNote(draught: Draught): void {
  const { resolved, sky, mm, places } = draught;
  const { backing } = resolved;
  if (backing === null) return;
  const words = `backing, ${backing.counts === 'masonry' ? 'counted as masonry' : 'weight only'}`;
  const placings = [0, 4, -4, 8].flatMap((up): Placing[] => {
    const y = backing.level + mm(up - LETTERS / 2);
    const how = { height: LETTERS, role: 'text-quiet', about: { kind: 'field', path: 'backing.level' } } as const;
    return [
      [lettering(words, { x: sky.left.x - mm(2), y }, { ...how, align: 'end' })],
      [lettering(words, { x: sky.right.x + mm(2), y }, how)],
    ];
  });
  put(draught, 'notes', ...(places.place(placings) ?? []));
}

/** Numbers at the springings, at the hinges, and at every fifth or tenth joint; inside the opening first. */
function drawJointNumbers(draught: Draught): void {
  const { standing, joints, mm, places } = draught;
  const last = standing.length - 1;
  const every = last <= 12 ? 1 : last <= 40 ? 5 : 10 ** Math.ceil(Math.log10(last / 40));
  const hinges = hingedJoints(draught);
  const wanted = joints.filter((joint) => joint === 0 || joint === last || joint % every === 0 || hinges.has(joint));
  // Hinges first: theirs are the numbers that the findings speak of.
  const ordered = [...wanted.filter((joint) => hinges.has(joint)), ...wanted.filter((joint) => !hinges.has(joint))];
  for (const joint of ordered) {
    const { intrados, extrados } = standing[joint]!;
    const outwards = Math.atan2(extrados.y - intrados.y, extrados.x - intrados.x);
    const number = (centre: { x: number; y: number }): Placing => [
      lettering(
        String(joint),
        { x: centre.x, y: centre.y - mm(LETTERS / 2) },
        { height: LETTERS, align: 'middle', role: 'text-quiet', about: { kind: 'joint', joint } },
      ),
    ];
    const away = mm(FROM_FACE + textWidth(String(joint), LETTERS) / 2 - LETTERS * CAPITAL_HEIGHT * 0.3);
    const placings = [0, 0.6, -0.6, 1.1, -1.1].flatMap((aside) => [
      number(along(intrados, outwards + aside, -away)),
      number(along(extrados, outwards + aside, away)),
    ]);
    put(draught, 'notes', ...(places.place(placings) ?? []));
  }
}
