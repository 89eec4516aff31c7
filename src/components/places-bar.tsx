import { useState, type MouseEvent } from 'react';
import { useEscape } from './use-escape';

export interface Place {
  readonly key: string;
  readonly label: string;
  readonly href: string;
  readonly count?: string;
}

export interface PlacesBarProps {
  readonly label: string;
  /** In order of use: the first is nearest the thumb. */
  readonly places: readonly Place[];
  readonly current: string;
  readonly onGo?: (place: Place) => void;
  /** What the phone's switcher is called to whoever hears the screen. */
  readonly switchLabel: string;
}

/** The line above the places, interrupted where you are. On a phone only that place stands there and opens the rest. */
export function PlacesBar({ label, places, current, onGo, switchLabel }: PlacesBarProps) {
  const [open, setOpen] = useState(false);
  useEscape(open, () => setOpen(false));
  const here = places.find((place) => place.key === current);
  const go = (event: MouseEvent, place: Place): void => {
    if (event.metaKey || event.ctrlKey || event.shiftKey || event.button !== 0) return;
    setOpen(false);
    if (onGo === undefined) return;
    event.preventDefault();
    onGo(place);
  };
  return (
    <nav className="places-bar" aria-label={label} data-open={open}>
      <button
        type="button"
        className="places-here"
        aria-expanded={open}
        aria-label={`${here?.label ?? ''}, ${switchLabel}`}
        onClick={() => setOpen(!open)}
      >
        {here?.label}
      </button>
      <ul>
        {places.map((place) => (
          <li key={place.key} className={place.key === current ? 'here' : ''}>
            <a
              href={place.href}
              {...(place.key === current ? { 'aria-current': 'page' as const } : {})}
              onClick={(event) => go(event, place)}
            >
              <span>{place.label}</span>
              {place.count ? <span>{place.count}</span> : null}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  );
}
