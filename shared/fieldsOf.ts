import type * as z from 'zod/mini';
import type { Fields } from './refusal';

/** Zod's issues as one message a field, the first of each; keys that nobody asked for are named. */
export function fieldsOf(error: z.core.$ZodError): Fields {
  const fields: Fields = {};
  const put = (path: PropertyKey[], message: string) => {
    const name = path.map(String).join('.') || 'form';
    fields[name] ??= message;
  };
  for (const issue of error.issues) {
    if (issue.code === 'unrecognized_keys')
      for (const key of issue.keys) put([...issue.path, key], 'Nobody asked for this');
    else if (issue.code === 'invalid_union' && issue.errors.length > 0) {
      // The branch that came furthest says it best.
      const best = [...issue.errors].sort((a, b) => depth(b) - depth(a))[0] ?? [];
      for (const inner of best) put([...issue.path, ...inner.path], inner.message);
      if (best.length === 0) put(issue.path, issue.message);
    } else put(issue.path, issue.message);
  }
  return fields;
}

const depth = (issues: z.core.$ZodIssue[]) => Math.max(0, ...issues.map((issue) => issue.path.length));
