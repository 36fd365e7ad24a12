/** Paths of the drawing model as an SVG element's `d`, in the scene's own units with y turned down. */
import type { PathItem } from '../../core/drawing/scene.ts';

export function pathData({ start, edges, closed }: PathItem): string {
  const steps = [`M${start.x} ${-start.y}`];
  for (const edge of edges) {
    if (edge.kind === 'line') steps.push(`L${edge.to.x} ${-edge.to.y}`);
    else {
      const large = Math.abs(edge.turn) > Math.PI ? 1 : 0;
      const sweep = edge.turn > 0 ? 0 : 1;
      steps.push(`A${edge.radius} ${edge.radius} 0 ${large} ${sweep} ${edge.to.x} ${-edge.to.y}`);
    }
  }
  return steps.join('') + (closed ? 'Z' : '');
}
