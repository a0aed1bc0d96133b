// All computing, pure: no file, clock, network, console or DOM.
export type * from './geometry/conductors.ts';
export type * from './soil/soil-model.ts';
