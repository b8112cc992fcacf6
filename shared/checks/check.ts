import type { Forging } from '../forging/index.js';
import type { Format } from '../units/index.js';

/** Gravest first: can't work; may fail; good to know. */
export const WARNING_SEVERITIES = ['stop', 'caution', 'note'] as const;
export type WarningSeverity = (typeof WARNING_SEVERITIES)[number];

/** The figures a warning rests on; names end in the unit, temperature differences in K. */
export type WarningValues = Readonly<Record<string, number | string>>;

/** Something a check found: where, how grave, with which figures. */
export interface Finding<V extends WarningValues = WarningValues> {
  readonly severity: WarningSeverity;
  /** Id of the bar. */
  readonly bar: string;
  /** Null for what a bar is laid from. */
  readonly stepId: string | null;
  readonly values: V;
}

/** What a warning says: what is wrong with which figures and why, and what to do about it. */
export interface WarningWords {
  readonly message: string;
  readonly remedy: string;
}

/** One rule of the trade. */
export interface Check<V extends WarningValues = WarningValues> {
  /** Stable name, kebab-case. */
  readonly code: string;
  /** Where the rule comes from, in words, with its status. */
  readonly source: string;
  readonly find: (forging: Forging) => readonly Finding<V>[];
  /** Words in the reader's units; made from the values alone, so that a stored warning can be told anew. */
  readonly words: (values: V, severity: WarningSeverity, format: Format) => WarningWords;
}

/** Gives a check the form in which the list holds it: `words` is only ever called with values of its own `find`. */
export function check<V extends WarningValues>(own: Check<V>): Check {
  return own as unknown as Check;
}

/** The gravest severity whose threshold a figure is past; thresholds missing from `limits` never apply. */
export function severityAbove(
  figure: number,
  limits: Partial<Readonly<Record<WarningSeverity, number>>>,
): WarningSeverity | null {
  return WARNING_SEVERITIES.find((severity) => figure > (limits[severity] ?? Infinity)) ?? null;
}

/** The gravest severity whose threshold a figure is under. */
export function severityBelow(
  figure: number,
  limits: Partial<Readonly<Record<WarningSeverity, number>>>,
): WarningSeverity | null {
  return WARNING_SEVERITIES.find((severity) => figure < (limits[severity] ?? -Infinity)) ?? null;
}
