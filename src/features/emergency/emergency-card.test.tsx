// @vitest-environment happy-dom
import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { LabSettings } from '../../domain/book/rig-spec';
import { EmergencyCard } from './emergency-card';

const settings: LabSettings = {
  name: 'Bench',
  zone: 'Europe/London',
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'forbidden',
  emergency: {
    isolator: 'Red rotary isolator, left of the door.',
    ring: [{ who: 'Site desk', number: 'ext. 5500' }],
    first_aid: 'See a doctor the same day.',
  },
};

const headings = (): string[] => screen.getAllByRole('heading').map((one) => one.textContent);

describe('emergency card', () => {
  it('says in order what to switch off, short, ring and do', () => {
    render(<EmergencyCard settings={settings} />);
    expect(headings()).toEqual(['Switch off', 'Short, and shout', 'Ring', 'First aid']);
    expect(screen.getByText('Red rotary isolator, left of the door.')).toBeDefined();
    expect(screen.getByRole('link', { name: 'ext. 5500' }).getAttribute('href')).toBe('tel:5500');
  });

  it('keeps its order on a tablet that knows no lab yet', () => {
    render(<EmergencyCard settings={null} />);
    expect(headings()).toEqual(['Switch off', 'Short, and shout', 'Ring', 'First aid']);
    expect(screen.getByText(/not known on this tablet/)).toBeDefined();
  });
});
