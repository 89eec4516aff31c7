/** What a wired foot key may send; `either` listens for the two commonest. */
export const FOOT_KEY_SETTINGS = ['either', 'F13', 'F14', 'PageDown', 'PageUp'] as const;
export type FootKeySetting = (typeof FOOT_KEY_SETTINGS)[number];

/** How the app looks on this tablet and what is wired to it: kept apart from the Book, since it must be known before the first paint. */
export interface DisplaySettings {
  readonly hand: 'right' | 'left';
  /** By place: dark at the bench, daylight at the Desk. */
  readonly theme: 'by-place' | 'dark' | 'daylight';
  readonly eyewear: boolean;
  /** 1 to 2. */
  readonly scale: number;
  /** Measured with the ruler; null leaves the reference tablet's figure. */
  readonly px_per_mm: number | null;
  readonly foot_key: FootKeySetting;
  /** What a short press does: log the reading again, or start and stop a burst. Held for a second it stands the rig down. */
  readonly foot_does: 'log' | 'burst';
}

export const DEFAULT_DISPLAY: DisplaySettings = {
  hand: 'right',
  theme: 'by-place',
  eyewear: false,
  scale: 1,
  px_per_mm: null,
  foot_key: 'either',
  foot_does: 'log',
};

const KEY = 'holdoff.display';

/** From here on the layout gives way to the text. */
const LARGE_TEXT_FROM = 1.3;

export interface TextStore {
  readonly getItem: (key: string) => string | null;
  readonly setItem: (key: string, value: string) => void;
}

/** What was kept, with anything unreadable replaced by its default. */
export function readDisplay(store: TextStore): DisplaySettings {
  let kept: Partial<DisplaySettings> = {};
  try {
    const parsed: unknown = JSON.parse(store.getItem(KEY) ?? '{}');
    if (typeof parsed === 'object' && parsed !== null) kept = parsed;
  } catch {
    return DEFAULT_DISPLAY;
  }
  const { hand, theme, eyewear, scale, px_per_mm, foot_key, foot_does } = kept;
  return {
    hand: hand === 'left' ? 'left' : 'right',
    theme: theme === 'dark' || theme === 'daylight' ? theme : 'by-place',
    eyewear: eyewear === true,
    scale: typeof scale === 'number' && scale >= 1 && scale <= 2 ? scale : 1,
    px_per_mm: typeof px_per_mm === 'number' && px_per_mm >= 2 && px_per_mm <= 20 ? px_per_mm : null,
    foot_key: FOOT_KEY_SETTINGS.find((each) => each === foot_key) ?? 'either',
    foot_does: foot_does === 'burst' ? 'burst' : 'log',
  };
}

/** False when the browser keeps nothing: the setting then holds until the page goes. */
export function keepDisplay(store: TextStore, settings: DisplaySettings): boolean {
  try {
    store.setItem(KEY, JSON.stringify(settings));
    return true;
  } catch {
    return false;
  }
}

/** Writes the settings on the root element, where the tokens read them. */
export function applyDisplay(root: HTMLElement, settings: DisplaySettings, place: 'bench' | 'desk'): void {
  const daylight = settings.theme === 'daylight' || (settings.theme === 'by-place' && place === 'desk');
  setAttribute(root, 'data-theme', daylight ? 'daylight' : null);
  setAttribute(root, 'data-hand', settings.hand === 'left' ? 'left' : null);
  setAttribute(root, 'data-eyewear', settings.eyewear ? 'on' : null);
  setAttribute(root, 'data-large-text', settings.scale > LARGE_TEXT_FROM ? '' : null);
  setProperty(root, '--scale', settings.scale === 1 ? null : String(settings.scale));
  setProperty(root, '--mm', settings.px_per_mm === null ? null : `${settings.px_per_mm}px`);
}

function setAttribute(root: HTMLElement, name: string, value: string | null): void {
  if (value === null) root.removeAttribute(name);
  else root.setAttribute(name, value);
}

function setProperty(root: HTMLElement, name: string, value: string | null): void {
  if (value === null) root.style.removeProperty(name);
  else root.style.setProperty(name, value);
}
