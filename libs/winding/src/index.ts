export { windingProblems, type Conductor, type FlatWire, type RoundWire, type WindingConnection, type WindingData, type WindingProblem } from './winding-data.js';
export { distributionFactor, pitchFactor, windingFactors, type WindingFactors } from './winding-factors.js';
