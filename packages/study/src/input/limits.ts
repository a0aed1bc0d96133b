// What the readers accept at most and at least; beyond it an input is a slip, not a study.

/** Largest table, bytes. Reason: 100 000 conductors take about 12 MB; a larger file is refused before it is read. */
export const LARGEST_TABLE_BYTES = 50_000_000;

/** Largest study.json, bytes. Reason: a hundred areas of 500 corners take 1 MB. */
export const LARGEST_STUDY_BYTES = 2_000_000;

/** Most conductors in a study. Reason: five times the largest electrode that the solver is meant for. */
export const MOST_CONDUCTORS = 100_000;

/** Most columns of a table. Reason: each name is compared with those that are known. */
export const MOST_COLUMNS = 1000;

/** Most points in a points table. Reason: a lattice of 1000 by 1000. */
export const MOST_POINTS = 1_000_000;

/** Deepest nesting in study.json. Reason: the schema needs 6; the reader recurses once a level. */
export const DEEPEST_NESTING = 32;

/** Most faults of one kind listed for one place of one file; the rest is counted. Reason: a readable list. */
export const MOST_ALIKE_FAULTS = 200;

/** Longest part of a value shown in a message, characters. */
export const LONGEST_SHOWN = 40;

/** Longest id, electrode or case name, characters. Reason: labels on figures. */
export const LONGEST_NAME = 120;

/** Longest path of a table, characters. Reason: some file systems take no more than 255 for a name. */
export const LONGEST_PATH = 240;

/** Longest place in study.json whose line is kept, characters. Reason: those of the schema stay below 40. */
export const LONGEST_PLACE = 300;

/** Longest title, characters. Reason: one line of the sheet. */
export const LONGEST_TITLE = 200;

/** Longest entry of the project data and of a revision, characters. Reason: one line of the sheet. */
export const LONGEST_ENTRY = 200;

/** Longest revision mark and longest date of one, characters. Reason: narrow columns of a table. */
export const LONGEST_MARK = 20;
export const LONGEST_DATE = 40;

/** Longest note under a section, characters. Reason: two printed pages; more is a document of its own. */
export const LONGEST_NOTE = 8000;

/** Most revisions. Reason: a table that fits on a page. */
export const MOST_REVISIONS = 100;

/** Largest plan coordinate, m. Reason: national grids stay below 4e7 m; lengths keep 1e-8 m beside it. */
export const LARGEST_COORDINATE_M = 1e8;

/** Largest depth, m. Reason: deep-well electrodes reach some 300 m. */
export const LARGEST_DEPTH_M = 10_000;

/** Largest diameter of metal, m. Reason: bored piles drawn as conductors reach 3 m. */
export const LARGEST_DIAMETER_M = 5;

/** Smallest diameter of metal, m. Reason: finer than any wire; the unit must be wrong. */
export const SMALLEST_DIAMETER_M = 1e-5;

/** Diameter below which a note asks to check the unit, m. Reason: half of the thinnest earthing wire in use. */
export const THIN_DIAMETER_M = 1e-3;

/** Extent in plan above which a note asks to check the unit, m. Reason: millimetres read as metres. */
export const WIDE_EXTENT_M = 10_000;

/** Smallest and largest series resistance, Ω/m. Reason: a copper bar 5 m thick has 9e-10; beyond any conductor. */
export const SMALLEST_RESISTANCE_OHM_PER_M = 1e-10;
export const LARGEST_RESISTANCE_OHM_PER_M = 1e6;

/** Smallest and largest resistivity of soil, Ω·m. Reason: sea water has 0.2, dry or frozen rock up to 1e6. */
export const SMALLEST_SOIL_RESISTIVITY_OHM_M = 0.01;
export const LARGEST_SOIL_RESISTIVITY_OHM_M = 1e7;

/** Largest resistivity of a covering, Ω·m. Reason: dry concrete and asphalt reach 1e9. */
export const LARGEST_COVERING_RESISTIVITY_OHM_M = 1e10;

/** Largest thickness of a covering, m. Reason: thicker is a soil layer, or millimetres read as metres. */
export const LARGEST_COVERING_THICKNESS_M = 1;

/** Smallest and largest thickness of a soil layer, m. Reason: thinner has no effect, thicker has no bottom. */
export const SMALLEST_LAYER_THICKNESS_M = 0.01;
export const LARGEST_LAYER_THICKNESS_M = 100_000;

/** Most soil layers: the image lists are tested to ten; no survey resolves more than five. */
export const MOST_SOIL_LAYERS = 10;

/** Most layers fitted to a survey. Reason: one more would have as many numbers as a usual survey has readings. */
export const MOST_FITTED_LAYERS = 5;

/** Most seasons of a study. Reason: one a month; each is solved as the study is. */
export const MOST_SEASONS = 12;

/** Most readings of a survey. Reason: ten days in the field; the family of soils is drawn from all of them. */
export const MOST_READINGS = 1000;

/** Smallest and largest distance of pins, m. Reason: soil boxes have some centimetres, soundings end at kilometres. */
export const SMALLEST_PIN_DISTANCE_M = 0.01;
export const LARGEST_PIN_DISTANCE_M = 20_000;

/** Largest fault current, A. Reason: ten times the largest of any power system. */
export const LARGEST_CURRENT_A = 1e6;

/** Largest X/R ratio. Reason: at generator terminals it reaches some 100. */
export const LARGEST_X_OVER_R = 1000;

/** Largest frequency of the fault current, Hz. Reason: supplies on aircraft and ships. */
export const LARGEST_FREQUENCY_HZ = 400;

/** Range of fault durations, s. Source: IEEE Std 80-2000, clause 5.2, range of the energy rule (from memory). */
export const SHORTEST_DURATION_S = 0.03;
export const LONGEST_DURATION_S = 3;

/** Frequencies of the body-current limits, Hz. Source: IEEE Std 80-2000, clause 5.1 (from memory). */
export const LOWEST_LIMIT_FREQUENCY_HZ = 50;
export const HIGHEST_LIMIT_FREQUENCY_HZ = 60;

/** Most cases and areas in a study. Reason: a sheet that can be read. */
export const MOST_CASES = 100;
export const MOST_AREAS = 100;

/** Most corners of an area. Reason: every pair of edges is tried for a crossing. */
export const MOST_CORNERS = 1000;

/** Most tables of conductors in a study. */
export const MOST_TABLES = 100;

/** Most electrodes that study.json may name. */
export const MOST_ELECTRODES = 1000;
