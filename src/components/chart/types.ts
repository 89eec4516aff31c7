export interface Axis {
  readonly min: number;
  readonly max: number;
  readonly unit: string;
  readonly kind?: 'linear' | 'log';
  /** Digits after the point at the cursor and in the table. */
  readonly decimals?: number;
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

export interface BandPoint {
  readonly x: number;
  readonly low: number;
  readonly high: number;
}

export interface WorkingPoint extends BandPoint {
  /** A reading between the two limits. */
  readonly y?: number;
  /** Without the lines that carry it to the axes. */
  readonly bare?: boolean;
}

export interface SliceFace {
  /** Formatted, rounded away from the danger by the caller. */
  readonly value: string;
  readonly unit: string;
  readonly words: string;
  readonly note?: string;
}

/** The answer, as a slice of the chart on the chart's own scale. */
export interface Slice {
  readonly high: SliceFace;
  readonly low: SliceFace;
  readonly middle: readonly { readonly label: string; readonly value: string }[];
  /** The face that the answer leans on. */
  readonly lean: 'low' | 'high';
}

export interface ChartReading extends Point {
  readonly number?: string;
  /** Out of family: an open ring with its number. */
  readonly odd?: boolean;
}

export interface CursorValues {
  readonly x: number;
  readonly low?: number;
  readonly high?: number;
  readonly law?: number;
  readonly own?: number;
  /** Of the named curves; null outside their range or where they are broken. */
  readonly curves?: readonly { readonly label: string; readonly value: number | null }[];
}

export interface ChartWords {
  readonly showTable: string;
  readonly showChart: string;
  readonly low: string;
  readonly high: string;
  readonly law: string;
  readonly own: string;
  readonly number: string;
}

export interface ChartData {
  readonly x: Axis;
  readonly y: Axis;
  /** Two solid bodies and the void between them. */
  readonly band?: {
    readonly points: readonly BandPoint[];
    readonly above: string;
    readonly below: string;
    /** Each point holds the extremes from it to the next: what the table leaves out leaves its extremes behind. */
    readonly extremes?: boolean;
  };
  /** Dotted. */
  readonly law?: readonly Point[];
  /** Heavy, over the range in which it was measured. */
  readonly own?: { readonly points: readonly Point[]; readonly label?: string };
  readonly curves?: readonly {
    readonly points: readonly Point[];
    readonly weight: 'thin' | 'curve';
    readonly label?: string;
  }[];
  /** The short label stands where the plot is narrow. */
  readonly limit?: { readonly y: number; readonly label: string; readonly short?: string };
  /** Nothing is drawn beyond it. */
  readonly wall?: { readonly from: number; readonly label: string };
  readonly point?: WorkingPoint;
  readonly readings?: readonly ChartReading[];
  /** What is allowed along x, as a void in a bar under the axis. */
  readonly window?: { readonly min: number; readonly max: number };
  readonly spans?: readonly { readonly from: number; readonly to: number; readonly label: string }[];
  readonly notValid?: { readonly from: number; readonly label: string };
}
