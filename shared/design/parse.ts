import type * as z from 'zod';
import { findSteel } from '../steels/index.js';
import { DESIGN_FORMAT, DESIGN_VERSION, type Design, designSchema } from './schema.js';

/** Something wrong in a document: where (keys and indexes from its root), which rule, and in words. */
export interface DesignProblem {
  readonly path: readonly (string | number)[];
  readonly code: string;
  readonly message: string;
}

export type ParsedDesign =
  | { readonly ok: true; readonly design: Design }
  | { readonly ok: false; readonly isNewer: boolean; readonly problems: readonly DesignProblem[] };

/** One step from a version to the next, on plain JSON; versions before 1 were never given out. */
type Migration = (document: Record<string, unknown>) => Record<string, unknown>;
const MIGRATIONS: Readonly<Record<number, Migration>> = {};

/**
 * Reads a design document from JSON of any origin: migrates an older version, refuses a newer one untouched, checks
 * every field and every reference. Never throws.
 */
export function parseDesign(json: unknown): ParsedDesign {
  if (typeof json !== 'object' || json === null || Array.isArray(json)) {
    return refused([{ path: [], code: 'not-a-design', message: 'A design is a JSON object.' }]);
  }
  let document = json as Record<string, unknown>;
  if (document['format'] !== DESIGN_FORMAT) {
    const message = `The field format says ${said(document['format'])}; a design says "${DESIGN_FORMAT}".`;
    return refused([{ path: ['format'], code: 'not-a-design', message }]);
  }
  const version = document['version'];
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1) {
    const message = `The field version says ${said(version)}; it must be a whole number from 1 on.`;
    return refused([{ path: ['version'], code: 'version-unknown', message }]);
  }
  if (version > DESIGN_VERSION) {
    const message = `This design was made by a newer program (document version ${version}; this program reads up to ${DESIGN_VERSION}). It was left as it is.`;
    return { ok: false, isNewer: true, problems: [{ path: ['version'], code: 'version-newer', message }] };
  }
  for (let from = version; from < DESIGN_VERSION; from++) document = MIGRATIONS[from]?.(document) ?? document;
  const parsed = designSchema.safeParse(document);
  if (!parsed.success) return refused(parsed.error.issues.flatMap(asProblems));
  const problems = designProblems(parsed.data);
  return problems.length > 0 ? refused(problems) : { ok: true, design: parsed.data };
}

/** What ties the parts of a well-formed document together: ids used once, references that lead somewhere. */
export function designProblems(design: Design): readonly DesignProblem[] {
  const problems: DesignProblem[] = [];
  const report = (path: (string | number)[], code: string, message: string): void => {
    problems.push({ path, code, message });
  };
  const ownSteels = new Set<string>();
  design.steels?.forEach((steel, i) => {
    if (ownSteels.has(steel.id))
      report(['steels', i, 'id'], 'id-twice', `Two steels have the id "${steel.id}".`);
    ownSteels.add(steel.id);
  });
  const before = new Set<string>();
  const stepIds = new Set<string>();
  design.bars.forEach((bar, b) => {
    if (before.has(bar.id)) report(['bars', b, 'id'], 'id-twice', `Two bars have the id "${bar.id}".`);
    if (bar.start.kind === 'stack') {
      bar.start.layers.forEach((layer, i) => {
        if (!ownSteels.has(layer.steel) && findSteel(layer.steel) === undefined) {
          const message = `Layer ${i + 1} of "${bar.name}" is of steel "${layer.steel}", which neither the design nor the catalogue has.`;
          report(['bars', b, 'start', 'layers', i, 'steel'], 'steel-unknown', message);
        }
      });
    } else {
      bar.start.pieces.forEach((piece, i) => {
        if (!before.has(piece.bar)) {
          const message = `Piece ${i + 1} of "${bar.name}" is of bar "${piece.bar}", which does not come before it.`;
          report(['bars', b, 'start', 'pieces', i, 'bar'], 'bar-not-before', message);
        }
      });
    }
    bar.steps.forEach((step, s) => {
      if (stepIds.has(step.id)) {
        report(['bars', b, 'steps', s, 'id'], 'id-twice', `Two steps have the id "${step.id}".`);
      }
      stepIds.add(step.id);
    });
    before.add(bar.id);
  });
  if (!before.has(design.result)) {
    report(
      ['result'],
      'bar-unknown',
      `The result is bar "${design.result}", which the design does not have.`,
    );
  }
  return problems;
}

/** A value as it stands in the file. */
function said(value: unknown): string {
  return value === undefined ? 'nothing' : JSON.stringify(value);
}

function asProblems(issue: z.core.$ZodIssue): DesignProblem[] {
  const path = issue.path.map((key) => (typeof key === 'symbol' ? String(key) : key));
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      path: [...path, key],
      code: 'field-unknown',
      message: `There is no field "${key}" here.`,
    }));
  }
  return [{ path, code: issue.code.replaceAll('_', '-'), message: issue.message }];
}

function refused(problems: readonly DesignProblem[]): ParsedDesign {
  return { ok: false, isNewer: false, problems };
}
