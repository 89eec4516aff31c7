import { Reading, type ReadingProps } from './reading';

export interface TwoFacesProps {
  readonly low: string;
  /** What stands in the void, such as the law's own figure. */
  readonly middle?: string;
  readonly high: string;
  readonly unit: string;
  readonly label: string;
  readonly size?: ReadingProps['size'];
}

/** An interval in one line: a figure outside each face, the void between them is the answer. */
export function TwoFaces({ low, middle, high, unit, label, size = 'pin' }: TwoFacesProps) {
  return (
    <span className={`two-faces size-${size}`} role="group" aria-label={label}>
      <Reading value={low} size={size} />
      <span className="two-faces-void">{middle}</span>
      <Reading value={high} unit={unit} size={size} />
    </span>
  );
}
