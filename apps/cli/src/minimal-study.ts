// The smallest study.json worth starting from, for someone who comes with a table of conductors alone.

/** Invented values: each is to be replaced by those of the site. */
const MINIMAL = {
  format: 'ohmstead-study',
  version: 1,
  title: 'My substation',
  soil: { layers: [{ resistivity_ohm_m: 300, thickness_m: 2 }, { resistivity_ohm_m: 100 }] },
  cases: [{ name: 'bus fault', fault_current_A: 3000, division_factor: 0.6, duration_s: 0.5 }],
  limits: { basis: 'IEEE 80', body_mass_kg: 70 },
};

/**
 * Text of a study.json for a table of conductors.
 * @param table name of the table, relative to the study folder
 */
export function minimalStudy(table: string): string {
  const { format, version, title, soil, ...rest } = MINIMAL;
  return `${JSON.stringify({ format, version, title, soil, conductors: [table], ...rest }, undefined, 2)}\n`;
}

/** What a study is, and one to start from. */
export function whatAStudyIs(table: string): string {
  return `A study is a folder, or a zip of one, with a file study.json and the tables that it names.
The table says where the metal lies; study.json says what the soil is, what current flows and for
how long, and which limits hold. To start, put this study.json beside ${table} and
replace its invented values by those of your site:

${minimalStudy(table)}
Then: ohmstead solve FOLDER
`;
}
