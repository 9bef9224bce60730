import { scenarioField, type Problem } from '@noonwell/schema';

export interface FieldProblem {
  /** Path into the form: "document.catch.dish.apertureDiameterM", "name"; empty where no field can be named. */
  readonly path: string;
  readonly message: string;
}

/** What the server refused, by field of the form. */
export function problemsByField(problem: Problem): FieldProblem[] {
  const found = (problem.errors ?? []).map(({ path = '', reason, fix }) => ({
    path: path === '' || /^(?:document|name|weatherYearId)\b/.test(path) ? path : `document.${path}`,
    message: fix === undefined ? reason : `${reason} ${fix}`,
  }));
  return found.length > 0 ? found : [{ path: '', message: problem.detail ?? problem.title }];
}

export interface ListedProblem extends FieldProblem {
  readonly label: string;
}

/** Errors of the form as one flat list, in the order of the document: what the summary on top links to. */
export function listErrors(errors: unknown, path: readonly string[] = []): ListedProblem[] {
  if (typeof errors !== 'object' || errors === null) return [];
  if ('message' in errors && typeof errors.message === 'string' && 'type' in errors) {
    const joined = path.join('.');
    return [{ path: joined, label: labelOf(joined), message: errors.message }];
  }
  return Object.entries(errors).flatMap(([key, child]: [string, unknown]) =>
    // Of a table as a whole the form library keeps the error one level down; of the form as a whole, none here.
    key === 'ref' || (key === 'root' && path.length === 0)
      ? []
      : listErrors(child, key === 'root' ? path : [...path, key]),
  );
}

const OTHER_LABELS: Readonly<Record<string, string>> = { name: 'Name', weatherYearId: 'Weather year' };

function labelOf(path: string): string {
  const inDocument = path.replace(/^document\./, '');
  const field = scenarioField(inDocument) ?? scenarioField(inDocument.replace(/\.\d+$/, ''));
  return field?.label ?? OTHER_LABELS[path] ?? path;
}
