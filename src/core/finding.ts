/** How much a finding matters: an error stops the job, a warning may spoil a sheet, a note informs. */
export type Severity = 'error' | 'warning' | 'note';

/** Where in the drawing's text a finding was made; whatever is unknown is null. Lines and columns from 1. */
export interface Place {
  readonly element: string | null;
  readonly id: string | null;
  readonly line: number | null;
  readonly column: number | null;
}

/**
 * Something a person should know, as data: the sentence is made from `code` and `values` in
 * `report/sentences.ts`, and only there.
 */
export interface Finding {
  readonly code: string;
  readonly severity: Severity;
  readonly place: Place | null;
  /** Where it was met, the first place among them, up to some hundreds; left out where that is all. */
  readonly places?: readonly Place[];
  readonly values: Readonly<Record<string, string | number>>;
}
