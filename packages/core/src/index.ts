// All computing, pure: no file, clock, network, console or DOM.
export type * from './geometry/conductors.ts';
export { type ConductorMaterial, conductorMaterials } from './materials/conductor-materials.ts';
export type * from './soil/soil-model.ts';
