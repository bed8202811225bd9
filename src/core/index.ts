export { type AuditResult, auditLines as audit } from './audit/audit.js';
export type { LineSet } from './audit/lineSet.js';
export { linesOfDrawing, linesOfProgram } from './audit/lines.js';
export type { AuditOptions } from './audit/tolerances.js';
export {
  type ComparedSide,
  type CompareSettings,
  compareSides,
  sideOfDrawing,
  sideOfProgram,
} from './compare.js';
export type { Drawing, Layer, Strokes } from './drawing/drawing.js';
export { type Pen, type PenPlan, type PenRule, planPens } from './drawing/pens.js';
export { choosePens, type PenWishes } from './drawing/penWishes.js';
export { type ReadOptions, readDrawing } from './drawing/readDrawing.js';
export { DEFAULT_LIMITS, LIMIT_NAMES, type LimitName, type ReadingLimits } from './drawing/readingLimits.js';
export { DEFAULT_READING, type ReadingRules } from './drawing/readingRules.js';
export type { Finding, Place, Severity } from './finding.js';
export type { Chains, Segments } from './geometry/segments.js';
export { parseLengthMm } from './geometry/unit.js';
export { PEN_ON_Z } from './machine/penOnZ.js';
export type { MachineProfile } from './machine/profile.js';
export { checkCertificate } from './matching/certificate.js';
export { improveByExchange } from './matching/exchange.js';
export { greedyMatching } from './matching/greedy.js';
export {
  type MatchingOptions,
  type PerfectMatching,
  type Points,
  perfectMatching,
  planeProblem,
} from './matching/perfectMatching.js';
export type { Certificate, Matching, MatchingProblem } from './matching/problem.js';
export { type Measure, measureProgram } from './measure/measure.js';
export { type DrawnGraph, type Retraced, retracedWays } from './metric/retrace.js';
export { type LiftedMotion, liftedSeconds } from './metric/seconds.js';
export { type Ordered, orderDrawing as tour, type Written, writeAudited } from './pipeline.js';
export type { Program } from './program/program.js';
export { type GcodeReading, type GcodeReadOptions, readGcode } from './program/readGcode.js';
export type { Comparison, Difference } from './report/comparison.js';
export { comparisonTable } from './report/comparisonTable.js';
export { makeReport, type Report } from './report/report.js';
export { sentence } from './report/sentences.js';
export type { Survey } from './report/survey.js';
export { surveyTable } from './report/surveyTable.js';
export { findingLines, reportTable } from './report/table.js';
export { reportOf } from './reportOf.js';
export { DEFAULT_SETTINGS, type Hooks, type Settings, type Step } from './settings.js';
export { surveyDrawing } from './survey.js';
export { writeGcode } from './write/gcode.js';
export type { GcodeOptions } from './write/gcodeOptions.js';
export { type SvgOptions, withoutTravel, writeSvg } from './write/svg.js';
