// Version of the program, written into results and packs.
export const programVersion = '0.1.0';
