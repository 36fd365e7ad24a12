import { tick } from 'svelte';

export type Drawer = 'measures' | 'findings';

/** On a narrow screen the two sides are drawers over the board; one is open at a time. */
export class Drawers {
  open = $state<Drawer | null>(null);
  readonly panels: Record<Drawer, HTMLElement | null> = { measures: null, findings: null };
  readonly openers: Record<Drawer, HTMLElement | null> = { measures: null, findings: null };

  /** A drawer takes the focus when it opens and gives it back to its button. */
  async toggle(which: Drawer): Promise<void> {
    const opening = this.open !== which;
    this.open = opening ? which : null;
    await tick();
    (opening ? this.panels : this.openers)[which]?.focus();
  }

  /** Opens the measures at the field of a figure that is wanting. */
  async enterMissing(path: string): Promise<void> {
    this.open = 'measures';
    await tick();
    this.panels.measures?.querySelector<HTMLElement>(`[data-path="${CSS.escape(path)}"]`)?.focus();
  }
}
