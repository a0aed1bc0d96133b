// Places of fields, in bytes, as src/leakage/segment-records.ts and src/leakage/leakage-kernel.ts write them.

/** A segment: sixteen doubles, the centre in plan first. */
export const SEGMENT_SHIFT: usize = 7;
/** half vector in plan; nothing for a vertical one */
export const AT_HX: usize = 16;
export const AT_HY: usize = 24;
/** a third of the squared half length in plan */
export const AT_THIRD: usize = 32;
/** radius² */
export const AT_RADIUS: usize = 40;
/** squared distances from which one place of a table does, and from which the pair is far */
export const AT_SINGLE: usize = 48;
export const AT_NEAR: usize = 56;
/** depth of the centre, and unit vector */
export const AT_Z: usize = 64;
export const AT_UX: usize = 72;
export const AT_UY: usize = 80;
export const AT_UZ: usize = 88;
export const AT_LENGTH: usize = 96;
/** orders segments by layer, then index */
export const AT_RANK: usize = 104;
/** a whole number of 32 bits */
export const AT_CLASS: usize = 112;
/** squared distance in plan of the centre from which tables of all images hold */
export const AT_LEAST: usize = 120;

/** A class pair: four doubles, then whole numbers of 32 bits; an address of 0 is none. */
export const PAIR_FACTOR: usize = 0;
export const PAIR_FAR_PER: usize = 8;
export const PAIR_REST_PER: usize = 16;
export const PAIR_SMOOTH: usize = 24;
export const PAIR_FAR: usize = 32;
export const PAIR_REST: usize = 36;
/** all images, and those that neither rest nor nodes hold */
export const PAIR_IMAGES: usize = 40;
export const PAIR_COUNT: usize = 44;
export const PAIR_SINGLY: usize = 48;
export const PAIR_SINGLY_COUNT: usize = 52;
export const PAIR_NODES: usize = 56;
export const PAIR_WEIGHTS: usize = 60;

/** A rule: 32 points on [−1, 1], 32 weights; an odd one repeats its last point with weight nothing. */
export const RULE: usize = 512;
export const RULE_HALF: usize = 256;

/** An image: weight, sign, offset, nothing. */
export const IMAGE_SHIFT: usize = 5;
