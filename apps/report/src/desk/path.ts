// Paths into study.json.

/** Keys and places from the root of study.json inward, e.g. `['soil', 'layers', 0, 'resistivity_ohm_m']`. */
export type JsonPath = readonly (string | number)[];
