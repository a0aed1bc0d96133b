// Areas in plan under one name: polygons, questions to ask of them, and how to grow them.
export { areaSquareMetres, corridors, grownOutlines, type PlanLine } from './grown-area.ts';
export { insideArea, nearestOnBoundary, type Polygon } from './polygon.ts';
