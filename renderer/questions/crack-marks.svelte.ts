/** Crack marks put on the board or from the list, and the movements that explain them. */
import { crackReading, movementPatterns } from '../../core/assess/further.ts';
import type { CrackReading, Explanation } from '../../core/checks/crack-reading.ts';
import { patternFrame, type MovedRing } from '../../core/drawing/moved-ring.ts';
import type { Point } from '../../core/geometry/point.ts';
import { addCrack, removeCrack } from '../../core/job/edits.ts';
import type { Crack } from '../../core/job/schema.ts';
import type { Side } from '../../core/statics/hinge.ts';
import type { AssessedScheme } from '../../core/assess/assess.ts';
import type { Session } from '../session/session.svelte.ts';

export class CrackMarks {
  readonly #session: Session;
  /** A press on the board puts a mark. */
  marking = $state(false);
  /** The ranked movement that the board shows: pointed at, or kept by a press. */
  pointed = $state.raw<string | null>(null);
  kept = $state.raw<string | null>(null);
  readonly #reading: () => CrackReading | null;

  constructor(session: Session) {
    this.#session = session;
    this.#reading = settledOf(session, (assessed) => crackReading(assessed.built, movementPatterns(assessed.built)));
  }

  readonly reading: CrackReading | null = $derived.by(() => this.#reading());
  readonly cracks: readonly Crack[] = $derived.by(() => this.#session.scheme.cracks ?? []);

  readonly shown: Explanation | null = $derived.by(() => {
    const kind = this.pointed ?? this.kept;
    return this.reading?.ranking.find(({ pattern }) => pattern.kind === kind) ?? null;
  });
  readonly ring: MovedRing | null = $derived.by(() => {
    const { assessed } = this.#session;
    return assessed === null || this.shown === null ? null : patternFrame(assessed, this.shown.pattern, PATTERN_SHOWN);
  });

  add(joint: number, face: Side): void {
    this.#session.edit(`crack at joint ${joint}`, (scheme) => addCrack(scheme, { joint, face }));
  }

  remove({ id, joint }: Crack): void {
    this.#session.edit(`remove the crack${joint === undefined ? '' : ` at joint ${joint}`}`, (scheme) =>
      removeCrack(scheme, id),
    );
  }

  /** Marks the end of a joint nearest to the place, within reach; false where none is near. m */
  markAt(at: Point, reach: number): boolean {
    const found = nearestEnd(this.#session.assessed, at, reach);
    if (found !== null) this.add(found.joint, found.face);
    return found !== null;
  }
}

/** Share of the way to the last frame at which a pattern is shown: openings that can be seen, an arch that still is one. */
const PATTERN_SHOWN = 0.45;

export interface JointEnd {
  readonly joint: number;
  readonly face: Side;
}

/** The joint nearest to a place, m, within reach, at the face that the place is nearer to; null when none is near. */
export function nearestEnd(assessed: AssessedScheme | null, at: Point, reach: number): JointEnd | null {
  let nearest: JointEnd | null = null;
  let least = Infinity;
  for (const [joint, { intrados, extrados }] of (assessed?.ring.joints ?? []).entries()) {
    const dx = extrados.x - intrados.x;
    const dy = extrados.y - intrados.y;
    const along = ((at.x - intrados.x) * dx + (at.y - intrados.y) * dy) / (dx * dx + dy * dy);
    const share = Math.min(1, Math.max(0, along));
    const distance = Math.hypot(at.x - intrados.x - share * dx, at.y - intrados.y - share * dy);
    if (distance < least) {
      least = distance;
      nearest = { joint, face: share < 0.5 ? 'intrados' : 'extrados' };
    }
  }
  return least <= reach ? nearest : null;
}

/** An answer worked out anew for each arch shown, but not for every frame of a drag: until it ends the last one stands. */
export function settledOf<Answer>(session: Session, work: (assessed: AssessedScheme) => Answer): () => Answer | null {
  let last: Answer | null = null;
  let of: AssessedScheme | null = null;
  return () => {
    const { assessed, dragging } = session;
    if (dragging) return last;
    if (assessed !== of) last = assessed === null ? null : work(assessed);
    of = assessed;
    return last;
  };
}
