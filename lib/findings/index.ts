export { diagnoseWiring, expectedReadings } from './wiring/diagnose';
export { assessGfci, maxTripSeconds } from './protection/gfci';
export { assessAfci } from './protection/afci';
export { protectionAsked } from './protection/asked';
export { replacementChoices } from './protection/replacement';
export { editionInForce } from './protection/edition-in-force';
export { assessLoadTest } from './supply/load-test';
export { assessVoltage } from './supply/voltage';
export { checkCoverage } from './coverage';
export { evaluateInspection, type Evaluation } from './evaluate';
export { composeFinding, checkTemplate, originalTemplate, type ComposeOptions } from './wording/compose';
export { readingGrade } from './wording/reading-grade';

// What the product needs beside the functions of the design.
export { stillOffPoints, type StillOffPoint } from './still-off';
export { standingReadings, wiringEvidence, lampsInWords, voltsInWords, sensorInWords } from './evidence';
export { CATALOGUE } from './wording/catalogue/all';
export type { CatalogueEntry } from './wording/catalogue/entry';
export { CONDITION_WORDS, conditionName } from './wording/conditions';
export { SKIP_WORDS } from './wording/skip-words';
export { findForbiddenWords } from './wording/forbidden-words';
export { findTemplateProblem, renderTemplate, type TemplateProblem } from './wording/template';
export { TEMPLATE_VARIABLES, SAMPLE_VALUES, type TemplateVariable } from './wording/variables';
export { WORDING_PARTS, type WordingPart, type WordingSet } from './wording/wording-set';
export { URGENCY_SENTENCES, whatToDoFirst } from './wording/urgency-words';
export { REPORT_LIMITS } from './wording/report-limits';
export { stateProfile, STATE_RULES } from './states/all';
export type { StateProfile, ReportDeadline } from './states/profile';
