import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { fieldErrors } from '@/server/http/fieldErrors';

const Torque = z.union([z.number(), z.string().max(5, 'must be 5 characters or fewer')]);
const Body = z.object({ torque: Torque, rows: z.array(z.object({ flow: Torque }).strict()).optional() }).strict();

const errorsOf = (value: unknown) => {
  const read = Body.safeParse(value);
  return read.success ? [] : fieldErrors(read.error);
};

describe('what is wrong with a value that may be of several kinds', () => {
  it.each([
    [{}, [{ path: 'torque', message: 'is missing' }]],
    [{ torque: null }, [{ path: 'torque', message: 'must be a number or text' }]],
    [{ torque: true }, [{ path: 'torque', message: 'must be a number or text' }]],
    [{ torque: 'far too long' }, [{ path: 'torque', message: 'must be 5 characters or fewer' }]],
    [{ torque: 1, rows: [{ flow: 2 }, {}] }, [{ path: 'rows.1.flow', message: 'is missing' }]],
    [{ torque: 1, tork: 2 }, [{ path: '', message: 'has no "tork"; look at the spelling' }]],
    [{ torque: 1, rows: [{ flow: 2, floe: 1 }] }, [{ path: 'rows.0', message: 'has no "floe"; look at the spelling' }]],
  ])('%j', (value, errors) => expect(errorsOf(value)).toEqual(errors));
});
