import type { ReactNode } from 'react';
import { EmergencyTooth } from '../../src/components/emergency-tooth';
import { PlacesBar } from '../../src/components/places-bar';
import { ScreenLayout } from '../../src/components/screen-layout';
import { StateStrip, type StateStripProps } from '../../src/components/state-strip';
import { places } from './figures';

export const shorted: StateStripProps = {
  mark: 'bridged',
  ground: 'outline',
  title: 'Kettle',
  state: 'Shorted, declared',
  shortState: 'Shorted, 14 min',
  detail: '14 min ago, Milo Venn',
  person: 'Ada Brook',
  count: '12 to hand over',
  age_h: 14 / 60,
  onPress: () => undefined,
  pressLabel: 'show the bench face',
};

export interface FrameProps {
  readonly strip?: StateStripProps;
  readonly place: string;
  readonly children: ReactNode;
  readonly fields?: ReactNode;
  readonly thumbs?: ReactNode;
  readonly banner?: ReactNode;
}

export function Frame({ strip = shorted, place, children, ...rest }: FrameProps) {
  return (
    <ScreenLayout
      strip={<StateStrip {...strip} />}
      tooth={<EmergencyTooth label="Emergency" href="#emergency" />}
      places={<PlacesBar label="Places" places={places} current={place} switchLabel="other places" />}
      {...rest}
    >
      {children}
    </ScreenLayout>
  );
}

export const later = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));
