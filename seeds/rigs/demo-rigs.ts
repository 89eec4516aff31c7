import type { DemoRig } from './demo-rig';
import { HERON } from './heron';
import { KETTLE } from './kettle';
import { WREN } from './wren';

export const DEMO_RIGS: readonly DemoRig[] = [KETTLE, HERON, WREN];
