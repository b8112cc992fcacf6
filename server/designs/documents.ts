import { z } from 'zod';
import { DESIGN_VERSION, type Design, parseDesign } from '../../shared/design/index.js';
import { jsonPointer } from '../http/json-pointer.js';
import { Problem } from '../http/problem.js';
import { invalidRequest } from '../http/validate.js';

/**
 * A design document out of a request. Throws a problem that names each wrong field by a pointer that begins with
 * `prefix`, or, for a document of a newer version, one of its own kind.
 */
export function documentFrom(json: unknown, prefix: string): Design {
  const parsed = parseDesign(json);
  if (parsed.ok) return parsed.design;
  const issues = parsed.problems.map(({ path, code, message }) => ({
    pointer: prefix + jsonPointer(path),
    code,
    message,
  }));
  if (parsed.isNewer) throw new Problem('newer-document', { detail: issues[0]?.message ?? '', issues });
  throw invalidRequest(issues);
}

/** A stored document brought up to date; one of a newer version as it is, since it is not ours to change. */
export function storedDocument(documentJson: string): unknown {
  const json: unknown = JSON.parse(documentJson);
  const parsed = parseDesign(json);
  return parsed.ok ? parsed.design : json;
}

const versioned = z.looseObject({ version: z.number() });

/** Whether a stored document was written by a newer program, and so is not to be touched. */
export function isNewerDocument(documentJson: string): boolean {
  const parsed = versioned.safeParse(JSON.parse(documentJson));
  return parsed.success && parsed.data.version > DESIGN_VERSION;
}
