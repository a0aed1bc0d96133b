// The soil: horizontal layers, the last one without a bottom.

export interface SoilLayer {
  /** resistivity, Ω·m */
  readonly resistivity: number;
  /** thickness, m; Infinity for the last layer */
  readonly thickness: number;
}

/** Layers from the surface down; at least one. */
export interface SoilModel {
  readonly layers: readonly SoilLayer[];
}
