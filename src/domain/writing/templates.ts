import type { System } from '../procedure/systems';

/** A template as it is chosen from. */
export interface TemplateToChoose {
  /** Name of its file. */
  name: string;
  title: string;
  system: System;
  /** How many it has of each. */
  steps: number;
  cautions: number;
  holds: number;
}
