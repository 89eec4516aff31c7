import type { Step } from '../../book/sheet-spec';

/** Steps that both circuits share. Common practice, no source. */
export const SUPPLY_OFF: readonly Step[] = [
  {
    key: 'supply-off',
    type: 'confirm',
    title: 'Supply to zero, off, key out',
    detail: 'The key stays in your pocket until the sheet is closed.',
    waive: 'never',
  },
  {
    key: 'wait',
    type: 'wait',
    title: 'Wait for the bleeds',
    detail:
      'Computed for every node. It ends with the voltage not proven: short then, whatever the figure was.',
    waive: 'never',
  },
];

export const PROVE: readonly Step[] = [
  {
    key: 'meter-before',
    type: 'confirm',
    title: 'Meter proved before',
    detail: 'On a known source. A reading taken while anything fires proves nothing.',
    waive: 'never',
  },
  {
    key: 'residual-voltage',
    type: 'reading',
    title: 'Largest voltage on any node',
    detail: 'With the shorts just lifted, node by node, either sign; then the shorts go back at once.',
    quantity: 'Voltage',
    unit: 'V',
    lowest: -50,
    highest: 50,
    highest_from_rig: null,
    waive: 'never',
  },
  {
    key: 'meter-after',
    type: 'confirm',
    title: 'Meter proved after',
    detail: 'On the same source. A meter that died in between has proved nothing: start again at the stick.',
    waive: 'never',
  },
  {
    key: 'shorts-left-on',
    type: 'confirm',
    guards: 'shorting',
    title: 'Shorts left on',
    detail:
      'Film and ceramic give charge back over minutes. The shorts stay on until the next check takes them off.',
    waive: 'never',
  },
];

export const GAS_AND_LAST: readonly Step[] = [
  {
    key: 'gas-shut',
    type: 'confirm',
    title: 'Gas shut, vessel vented',
    detail:
      'Cylinder valve first, then the regulator, then vent through the extraction. Open gap: the channel’s gas.',
    waive: 'reviewer',
  },
  {
    key: 'vessel-vented',
    type: 'reading',
    title: 'Vessel pressure after venting',
    detail: 'Open gap: 0.',
    quantity: 'Gauge pressure',
    unit: 'bar(g)',
    lowest: -0.02,
    highest: 0.02,
    highest_from_rig: null,
    waive: 'reviewer',
  },
  {
    key: 'photo',
    type: 'photo',
    title: 'Photo of the shorts',
    detail: 'Every short in one picture.',
    waive: 'operator',
  },
  {
    key: 'second-person',
    type: 'second-person',
    title: 'Second person, before hands go in',
    detail: 'Looks at each short and at the meter, and says so.',
    waive: 'never',
  },
];
