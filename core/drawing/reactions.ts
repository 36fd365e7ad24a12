/** What each support gives back at the least thrust: an arrow into the springing joint, its figures at the tail. */
import type { Reaction } from '../assess/assessment.ts';
import type { Point } from '../geometry/point.ts';
import { put, type Draught } from './draught.ts';
import { figure } from '../quantity/figures.ts';
import { along, arrowhead, lettering, stroke } from './path.ts';
import type { Placing } from './places.ts';
import type { About } from './scene.ts';

/** Paper mm. */
const LENGTH = 15;
const HEAD = 3.6;
const LINE = 4;

export function drawReactions(draught: Draught): void {
  const { reactions } = draught.result;
  if (reactions === null) return;
  drawReaction(draught, 'left', reactions.left);
  drawReaction(draught, 'right', reactions.right);
}

function drawReaction(draught: Draught, side: 'left' | 'right', reaction: Reaction): void {
  const { x, y, horizontal, vertical } = reaction;
  if (x === null || y === null || Math.hypot(horizontal, vertical) === 0) return;
  const { mm, places } = draught;
  const about: About = { kind: 'support', side };
  const inwards = side === 'left' ? 1 : -1;
  const angle = Math.atan2(vertical, inwards * horizontal);
  const tip = { x, y };
  const tail = along(tip, angle, -mm(LENGTH));
  const shaft = stroke('reaction', tail, along(tip, angle, -mm(HEAD)), about);
  put(draught, 'reactions', shaft, arrowhead('reaction-head', tip, angle, mm(HEAD), about, 1.8));
  places.blockPath(stroke('reaction', tail, tip));
  const placed = places.placeSurely(figuresAt(draught, reaction, tail, inwards, about), tail);
  put(draught, 'reactions', ...placed.texts, ...(placed.leader === null ? [] : [placed.leader]));
}

/** Two lines beside the tail, then under it, then over it. */
function figuresAt({ mm }: Draught, reaction: Reaction, tail: Point, inwards: 1 | -1, about: About): Placing[] {
  const lines = [`thrust ${figure(reaction.horizontal)} kN`, `vertical ${figure(reaction.vertical)} kN`];
  const align = inwards === 1 ? 'end' : 'start';
  const at = (dx: number, dy: number): Placing =>
    lines.map((text, i) =>
      lettering(
        text,
        { x: tail.x + mm(-inwards * dx), y: tail.y + mm(dy - i * LINE) },
        { align, about, role: 'text-force' },
      ),
    );
  return [at(1.5, 0.7), at(1.5, -2.5), at(-8, -4.5), at(1.5, 6), at(4, -6)];
}
