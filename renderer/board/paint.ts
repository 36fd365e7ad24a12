/**
 * Paints a scene: one node for each layer of the drawing, each drawing its items straight onto the canvas. The nodes
 * stay; what they hold is put in place and all of them are drawn once.
 */
import type { Context } from 'konva/lib/Context.js';
import { Layer } from 'konva/lib/Layer.js';
import { Shape } from 'konva/lib/Shape.js';
import { Stage } from 'konva/lib/Stage.js';
import type { Joint } from '../../core/assess/assessment.ts';
import { LAYERS, type PathItem, type Scene, type SceneItem, type TextItem } from '../../core/drawing/scene.ts';
import { drawnStyle, FACES, type DrawnStyle, type Theme } from '../../core/drawing/style.ts';
import { emOf } from '../../core/drawing/text.ts';
import { PIXELS_PER_MILLIMETRE, toPixels, type Viewport } from './viewport.ts';

export interface MarkedJoint {
  readonly number: number;
  readonly joint: Joint;
}

export interface Picture {
  readonly scene: Scene | null;
  readonly viewport: Viewport;
  readonly theme: Theme;
  /** Joints pointed at by a finding. */
  readonly marked: readonly MarkedJoint[];
}

/** A pen thinner than this, px, would fade on the screen. */
const THINNEST_PEN = 0.75;

export class Painter {
  readonly #stage: Stage;
  readonly #layer: Layer;
  #picture: Picture | null = null;

  constructor(container: HTMLDivElement) {
    this.#stage = new Stage({ container, width: 1, height: 1, listening: false });
    this.#layer = new Layer({ listening: false });
    for (const name of LAYERS) this.#addNode((context) => this.#paintLayer(context, name));
    this.#addNode((context) => this.#paintMarks(context));
    this.#stage.add(this.#layer);
  }

  show(picture: Picture): void {
    const { width, height } = picture.viewport;
    this.#picture = picture;
    if (this.#stage.width() !== width || this.#stage.height() !== height) this.#stage.size({ width, height });
    this.#layer.draw();
  }

  destroy(): void {
    this.#stage.destroy();
  }

  #addNode(paint: (context: Context) => void): void {
    this.#layer.add(new Shape({ sceneFunc: paint, listening: false, perfectDrawEnabled: false }));
  }

  #paintLayer(context: Context, name: (typeof LAYERS)[number]): void {
    const picture = this.#picture;
    const layer = picture?.scene?.layers.find((candidate) => candidate.name === name);
    if (picture === null || layer === undefined) return;
    let role: SceneItem['role'] | null = null;
    let style: DrawnStyle = NOTHING;
    context.lineJoin = 'round';
    for (const item of layer.items) {
      if (item.role !== role) {
        role = item.role;
        style = drawnStyle(role, picture.theme);
        setPen(context, style);
      }
      if (item.kind === 'path') paintPath(context, item, style, picture.viewport);
      else paintText(context, item, style, picture.viewport);
    }
  }

  /** A broad line over each joint pointed at, past both its faces, with its number at the back. */
  #paintMarks(context: Context): void {
    if (this.#picture === null) return;
    const { viewport, theme, marked } = this.#picture;
    const ink = theme.ink ?? 'black';
    const ground = theme.sheet ?? 'white';
    context.setLineDash([]);
    context.lineCap = 'round';
    context.lineJoin = 'round';
    context.font = `bold ${MARK_LETTERS}px 'DejaVu Sans', sans-serif`;
    context.textAlign = 'center';
    context.textBaseline = 'middle';
    for (const { number, joint } of marked) {
      const a = toPixels(viewport, joint.intrados);
      const b = toPixels(viewport, joint.extrados);
      const length = Math.hypot(b.x - a.x, b.y - a.y);
      const [dx, dy] = [(b.x - a.x) / length, (b.y - a.y) / length];
      // A light line under the dark one parts it from whatever it crosses; so it is with the letters.
      for (const [colour, width] of [
        [ground, 7],
        [ink, 3],
      ] as const) {
        context.strokeStyle = colour;
        context.lineWidth = width;
        context.beginPath();
        context.moveTo(a.x - dx * PAST_FACE, a.y - dy * PAST_FACE);
        context.lineTo(b.x + dx * PAST_FACE, b.y + dy * PAST_FACE);
        context.stroke();
      }
      const words = `joint ${number}`;
      const at = { x: b.x + dx * (PAST_FACE + 34), y: b.y + dy * (PAST_FACE + 16) };
      context.strokeStyle = ground;
      context.lineWidth = 5;
      context.strokeText(words, at.x, at.y);
      context.fillStyle = ink;
      context.fillText(words, at.x, at.y);
    }
  }
}

/** px */
const PAST_FACE = 9;
const MARK_LETTERS = 14;

const NOTHING: DrawnStyle = { stroke: null, fill: null, pen: 0, dash: [] };

function setPen(context: Context, { stroke, fill, pen, dash }: DrawnStyle): void {
  if (fill !== null) context.fillStyle = fill;
  if (stroke === null) return;
  context.strokeStyle = stroke;
  context.lineWidth = Math.max(THINNEST_PEN, pen * PIXELS_PER_MILLIMETRE);
  context.setLineDash(dash.map((length) => length * PIXELS_PER_MILLIMETRE));
}

function paintPath(context: Context, path: PathItem, { stroke, fill }: DrawnStyle, viewport: Viewport): void {
  const start = toPixels(viewport, path.start);
  context.beginPath();
  context.moveTo(start.x, start.y);
  for (const edge of path.edges) {
    if (edge.kind === 'line') {
      const to = toPixels(viewport, edge.to);
      context.lineTo(to.x, to.y);
    } else {
      const { x, y } = toPixels(viewport, edge.centre);
      // On the screen y runs down, so angles change their sign and their sense.
      context.arc(x, y, edge.radius * viewport.scale, -edge.from, -(edge.from + edge.turn), edge.turn > 0);
    }
  }
  if (path.closed) context.closePath();
  if (fill !== null && path.closed) context.fill('evenodd');
  if (stroke !== null) context.stroke();
}

const ALIGN = { start: 'left', middle: 'center', end: 'right' } as const;

function paintText(context: Context, text: TextItem, { fill }: DrawnStyle, viewport: Viewport): void {
  if (fill === null) return;
  const { weight, slope } = FACES[text.face];
  const { x, y } = toPixels(viewport, text.at);
  context.font = `${slope} ${weight} ${emOf(text.height) * PIXELS_PER_MILLIMETRE}px 'DejaVu Sans', sans-serif`;
  context.textAlign = ALIGN[text.align];
  context.textBaseline = 'alphabetic';
  if (text.angle === 0) {
    context.fillText(text.text, x, y);
    return;
  }
  context.save();
  context.translate(x, y);
  context.rotate(-text.angle);
  context.fillText(text.text, 0, 0);
  context.restore();
}
