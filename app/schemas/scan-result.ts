export type ScanParameters = object;
export type ScanResult = object;
