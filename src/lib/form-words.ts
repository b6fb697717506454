import { z } from 'zod';

/** Plain words for what a form's schema refuses where the schema itself has none. */
export function setFormWords(): void {
  z.config({
    customError: (issue) => {
      switch (issue.code) {
        case 'invalid_type':
          return issue.input === undefined || issue.input === null || issue.input === '' ? 'Please fill this in.' : 'This cannot be read.';
        case 'invalid_value':
          return 'Please choose one of these.';
        case 'too_small':
          return issue.origin === 'string' ? 'Please fill this in.' : `Not less than ${String(issue.minimum)}, please.`;
        case 'too_big':
          return issue.origin === 'string' ? `At most ${String(issue.maximum)} characters, please.` : `Not more than ${String(issue.maximum)}, please.`;
        default:
          return undefined;
      }
    },
  });
}
