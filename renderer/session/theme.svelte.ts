/** Light or dark by the system unless the person chose; more contrast where the system asks for it. */
export type ThemeChoice = 'system' | 'light' | 'dark';

const KEY = 'skewback.theme';
const CHOICES: readonly ThemeChoice[] = ['system', 'light', 'dark'];

class Theme {
  #systemDark = $state(false);
  #forced = $state(false);
  choice = $state<ThemeChoice>('system');

  readonly dark: boolean = $derived(this.choice === 'system' ? this.#systemDark : this.choice === 'dark');
  /** The system paints in its own few colours. */
  readonly forced: boolean = $derived(this.#forced);

  /** Follows the system and remembers the choice; once, when the page starts. */
  start(): void {
    const kept = CHOICES.find((choice) => choice === localStorage.getItem(KEY));
    if (kept !== undefined) this.choice = kept;
    follow('(prefers-color-scheme: dark)', (matches) => (this.#systemDark = matches));
    follow('(forced-colors: active)', (matches) => (this.#forced = matches));
    this.#mark();
  }

  choose(choice: ThemeChoice): void {
    this.choice = choice;
    localStorage.setItem(KEY, this.choice);
    this.#mark();
  }

  #mark(): void {
    if (this.choice === 'system') delete document.documentElement.dataset['theme'];
    else document.documentElement.dataset['theme'] = this.choice;
  }
}

function follow(query: string, tell: (matches: boolean) => void): void {
  const list = matchMedia(query);
  tell(list.matches);
  list.addEventListener('change', ({ matches }) => tell(matches));
}

export const theme = new Theme();
