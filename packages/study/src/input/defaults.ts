// What is taken where a study says nothing; each use is told in a note.

export const DEFAULT_MATERIAL = 'copper-annealed';
export const DEFAULT_ELECTRODE = 'main';
export const DEFAULT_METAL_MODEL = 'resistive';
/** share of the fault current that enters the ground, all of it */
export const DEFAULT_DIVISION_FACTOR = 1;
/** Hz; matters only with `x_over_r`, and there it must be given */
export const DEFAULT_FREQUENCY_HZ = 50;
/** name of the soil of the study itself among the seasons */
export const SOIL_AS_GIVEN = 'as given';
