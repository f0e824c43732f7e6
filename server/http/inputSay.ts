/** Plain words for what a schema refuses, where the schema has none of its own. */
import type { z } from 'zod';

const NAMES: Record<string, string> = { string: 'a text', number: 'a number', int: 'a whole number', boolean: 'yes or no', array: 'a list', object: 'a group of values', record: 'a group of values' };

/** Message for one issue, or undefined to keep zod's own. */
export const inputSay: z.core.$ZodErrorMap = (issue) => {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined ? 'is missing' : `must be ${NAMES[issue.expected] ?? issue.expected}`;
    case 'unrecognized_keys':
      return `does not know ${issue.keys.map((key) => `"${key}"`).join(', ')}`;
    case 'invalid_value':
      return `must be ${issue.values.map((value) => JSON.stringify(value)).join(' or ')}`;
    case 'too_big':
      return `is above ${String(issue.maximum)}`;
    case 'too_small':
      return `is below ${String(issue.minimum)}`;
    default:
      return undefined;
  }
};
