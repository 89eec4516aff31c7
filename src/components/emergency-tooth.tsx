import type { MouseEvent } from 'react';

export interface EmergencyToothProps {
  readonly label: string;
  readonly href: string;
  readonly onPress?: () => void;
}

/** Hangs from the strip in the same place on every screen, whichever hand is in use. */
export function EmergencyTooth({ label, href, onPress }: EmergencyToothProps) {
  const press = (event: MouseEvent): void => {
    if (onPress === undefined || event.metaKey || event.ctrlKey || event.shiftKey) return;
    event.preventDefault();
    onPress();
  };
  return (
    <a className="emergency-tooth" href={href} onClick={press}>
      {label}
    </a>
  );
}
