// Titles of the figures, the same on the page and in their files.

export const titles = {
  plan: 'Electrode in plan',
  ground: 'Section through the ground',
  sounding: 'Sounding and fitted layers',
  soilBands: 'Worst voltages over the soils that the readings allow',
  seasons: 'Worst voltages by season against their limits',
  leakage: 'Leakage into the soil',
  limits: 'Worst voltages against their limits',
  potential: (name: string): string => `Surface potential, ${name}`,
  touch: (name: string): string => `Touch voltage, ${name}`,
  step: (name: string): string => `Step voltage, ${name}`,
  surface: 'Voltages over the plan',
  change: (name: string): string => `Change of touch voltage, ${name}`,
  profile: (name: string): string => `Profile through the worst touch voltage, ${name}`,
} as const;
