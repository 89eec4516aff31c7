import type { ReactNode } from 'react';

export interface ScreenLayoutProps {
  readonly strip: ReactNode;
  readonly tooth: ReactNode;
  /** The figure: what is between the electrodes. */
  readonly children: ReactNode;
  readonly fields?: ReactNode;
  readonly thumbs?: ReactNode;
  readonly places: ReactNode;
  /** As wide as the screen, above figure and fields, such as a wide mark. */
  readonly banner?: ReactNode;
}

/**
 * Strip above, figure in the rest, fields and thumb zone in a column on the hand's side, places at the foot. Figure and fields scroll
 * by themselves when they have to, so nothing ever slides under the thumb.
 */
export function ScreenLayout(props: ScreenLayoutProps) {
  const { strip, tooth, children, fields, thumbs, places, banner } = props;
  return (
    <div
      className={`screen-layout${banner === undefined ? '' : ' with-banner'}${fields === undefined && thumbs === undefined ? ' wide' : ''}`}
    >
      {strip}
      <aside>{tooth}</aside>
      <main className="screen-scroll">
        {banner === undefined ? null : <div className="screen-banner">{banner}</div>}
        <div className="screen-figure">{children}</div>
        {fields === undefined ? null : <div className="screen-fields">{fields}</div>}
      </main>
      {thumbs === undefined ? null : <div className="screen-thumbs">{thumbs}</div>}
      <div className="screen-places">{places}</div>
    </div>
  );
}
