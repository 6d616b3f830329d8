export type AssessmentResult = object;
