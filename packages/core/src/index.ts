// All computing, pure: no file, clock, network, console or DOM.

export { type Crew, HelperLost } from './crew/crew.ts';
export { crewOf, type Helper, type HelperHearing, helperCount, type Platform } from './crew/helpers.ts';
export { type Order, type Said, type Work, workshop } from './crew/workshop.ts';
export { decrementFactor } from './fault/decrement.ts';
export { type FaultToGround, gridCurrent } from './fault/grid-current.ts';
export { worstTouchNearLines } from './field/floating-touch.ts';
export { adaptiveLattices, type Box, type Lattice, latticeValue } from './field/lattice.ts';
export { type LineProfile, lineProfile } from './field/line-profile.ts';
export { type NearestNode, nearestNode, nodesReached } from './field/metal-nearby.ts';
export { potentialAt } from './field/potential.ts';
export { type ProgressiveMap, progressiveMaps } from './field/progressive-map.ts';
export { areaRegion, partOf, type Region, regionMask } from './field/region.ts';
export { latticeSummits } from './field/starts.ts';
export { PACE_M, stepLattice, type WorstStep, worstStep } from './field/step.ts';
export type { SurfaceMap } from './field/surface-map.ts';
export {
  onePotential,
  type SurfacePotential,
  type SurfacePotentials,
  surfacePotentials,
} from './field/surface-potential.ts';
export { type MetalPotential, touchLattice, type WorstPlace, worstTouch } from './field/touch.ts';
export {
  areaSquareMetres,
  corridors,
  grownOutlines,
  insideArea,
  nearestOnBoundary,
  type PlanLine,
  type Polygon,
} from './geometry/area.ts';
export { isRod, ROD_LEAN_DEGREES } from './geometry/conductor-axis.ts';
export type * from './geometry/conductors.ts';
export { CONTACT_TOLERANCE_M, NEAR_MISS_GAP_M } from './geometry/contact-tolerances.ts';
export { defaultAreas, STEP_MARGIN_M } from './geometry/default-areas.ts';
export { floatingJoined } from './geometry/floating-joined.ts';
export { type Joints, joinConductors } from './geometry/joints.ts';
export { meshOutlines } from './geometry/outline.ts';
export { segmentMesh } from './geometry/segmentation.ts';
export type { SegmentMesh } from './geometry/segments.ts';
export { useKernels } from './kernels/instance.ts';
export {
  type BlockPart,
  type BlockPlan,
  COMPRESSION,
  type CompressionOptions,
  planBlocks,
  plannedBytes,
} from './leakage/block-plan.ts';
export {
  assembleMatrix,
  type CompressedLeakageMatrix,
  compressedLeakageMatrix,
  type JoinedParts,
  joinParts,
  type PartProducts,
  type PartStart,
  startPart,
} from './leakage/compressed-matrix.ts';
export { partWorks } from './leakage/held-parts.ts';
export {
  type LeakageBlocks,
  type LeakageMatrix,
  leakageBlocks,
  leakageMatrix,
  planReach,
} from './leakage/leakage-matrix.ts';
export { leakageBytes, leakageOperator, leakageStorage } from './leakage/leakage-operator.ts';
export { type PartInputs, type PartMatrix, partMatrix } from './leakage/part-matrix.ts';
export { type KnownLeakage, type ReusedLeakage, reusedLeakageMatrix } from './leakage/reused-matrix.ts';
export { type ConductorMaterial, conductorMaterials } from './materials/conductor-materials.ts';
export { type Branches, branchCurrents, nodeOutflow, REMOTE_EARTH } from './network/branches.ts';
export { type ReducedLaplacian, reducedLaplacian } from './network/reduced-laplacian.ts';
export type { Complex, ComplexVector } from './numerics/complex-vector.ts';
export { type BlockRoom, blockRoom, MemoryRefused } from './numerics/dense-blocks.ts';
export { factorPacked } from './numerics/packed-cholesky.ts';
export { type Covering, coveringDeratingFactor } from './safety/covering-derating.ts';
export {
  type BodyMass,
  type Footing,
  LONGEST_DURATION_S,
  SHORTEST_DURATION_S,
  tolerableMetalToMetalVoltage,
  tolerableStepVoltage,
  tolerableTouchVoltage,
} from './safety/tolerable-voltage.ts';
export { judge, type Verdict } from './safety/verdict.ts';
export { IMAGE_TOLERANCE, type ImageList, type SoilImages, soilImages } from './soil/image-list.ts';
export { interfaceDepths } from './soil/layer-kernel.ts';
export { pointPotential } from './soil/point-potential.ts';
export { type SeasonalChange, seasonalSoil } from './soil/season.ts';
export type * from './soil/soil-model.ts';
export {
  type ComplexGraphSolution,
  type ComplexUnitSolution,
  solveGraphComplex,
} from './solve/complex-solution.ts';
export { type GraphSolution, type MetalModel, solveGraph, type UnitSolution } from './solve/solution.ts';
export { MODEL_FLOOR, refinementUncertainty } from './solve/uncertainty.ts';
export {
  bandOf,
  FAMILY_METHOD,
  type FamilyBand,
  type FamilyMember,
  type ParameterBand,
  RESOLVED_RATIO,
  type SoilFamily,
  type SoundingBand,
  soilFamily,
  soundingBand,
} from './survey/ambiguity.ts';
export {
  apparentFromResistance,
  type CollinearArray,
  type FourPinArray,
  geometricFactor,
  resistanceFromApparent,
  type SchlumbergerArray,
  spacingOf,
  type WennerArray,
} from './survey/arrays.ts';
export { type DegenerateLayer, degenerateLayers } from './survey/degeneracy.ts';
export { investigationRange, type SurveyDoubt, spacingDoubts, surveyDoubts } from './survey/doubts.ts';
export { type EquivalentResistivity, equivalentUniformResistivities } from './survey/equivalent-uniform.ts';
export { apparentResistivity } from './survey/forward.ts';
export {
  type FittedParameter,
  type FittedSurvey,
  type InversionOptions,
  invertSurvey,
  type ReadingFit,
  type RefusedSurvey,
} from './survey/inversion.ts';
export { medianDepth, wennerEquivalent } from './survey/investigation-depth.ts';
export { type LayerCandidate, type LayerProposal, proposeLayerCount } from './survey/layer-count.ts';
export { MOST_LAYERS } from './survey/model-parameters.ts';
export {
  type CheckedRows,
  checkRows,
  type Reading,
  type RowFinding,
  type SurveyRow,
} from './survey/readings.ts';
export {
  type Sounding,
  type SoundingPoint,
  soundingOf,
  type Traverse,
  traversesOf,
} from './survey/sounding.ts';
export { type SurveyFilter, surveyFilter } from './survey/survey-filter.ts';
