/** '2026-12-02 11:05 UTC' of an ISO time. */
export const minuteOf = (iso: string): string => `${iso.slice(0, 10)} ${iso.slice(11, 16)} UTC`;
