import { createContext, flushSync } from 'svelte';

export type Theme = 'light' | 'dark';
const storageKey = 'pump-ceiling/theme';

function remembered(): Theme | null {
  try {
    const kept = localStorage.getItem(storageKey);
    return kept === 'light' || kept === 'dark' ? kept : null;
  } catch {
    return null; // storage may be closed to the page; the system's theme then holds
  }
}

/** How the page is looked at; nothing here changes an answer. */
export class View {
  private system = $state<Theme>('light');
  private chosen = $state<Theme | null>(remembered());
  private printing = $state(false);
  /** Paper is white whatever the screen is. */
  theme = $derived<Theme>(this.printing ? 'light' : (this.chosen ?? this.system));

  /** Which state the rod section shows. */
  beam = $state<'lasing' | 'blocked'>('lasing');
  /** The pump axis of the sweeps. */
  pumpAxis = $state<'incident' | 'absorbed'>('incident');
  /** How far out the rod section looks. */
  wholeMount = $state(false);

  constructor() {
    const query = matchMedia('(prefers-color-scheme: dark)');
    const follow = () => (this.system = query.matches ? 'dark' : 'light');
    follow();
    query.addEventListener('change', () => {
      follow();
      this.apply();
    });
    this.apply();
    addEventListener('beforeprint', () => this.print(true));
    addEventListener('afterprint', () => this.print(false));
  }

  private print(printing: boolean): void {
    this.printing = printing;
    this.apply();
    flushSync();
  }

  /** At once, since drawings on canvas read their colours from the page. */
  private apply(): void {
    document.documentElement.dataset.theme = this.theme;
  }

  toggleTheme(): void {
    this.chosen = this.theme === 'dark' ? 'light' : 'dark';
    this.apply();
    try {
      localStorage.setItem(storageKey, this.chosen);
    } catch {
      // not remembered then; the page still changes
    }
  }
}

export const [useView, provideView] = createContext<View>();
