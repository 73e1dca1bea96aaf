import { z } from 'zod';
import { quantityOf } from '../measure/convert';
import type { Column, Field, Fields } from './fields';

/** The inputs of a worksheet as the API takes them. Only their shape: what a text means is for `readInputs`. */

const Typed = (what: string) =>
  z
    .union([z.number(), z.string().max(60)])
    .nullish()
    .describe(what);

const sentence = (...parts: (string | false | undefined)[]) => parts.filter(Boolean).join(' ');

function bounds(
  { above, least, most }: { above?: number; least?: number; most?: number },
  unit: string,
): string | undefined {
  const parts = [
    above !== undefined && `more than ${above}`,
    least !== undefined && `${least} or more`,
    most !== undefined && `${most} or less`,
  ].filter((part) => part !== false);
  return parts.length > 0 ? `In ${unit}: ${parts.join(', ')}.` : undefined;
}

function columnSchema(field: Column): z.ZodTypeAny {
  const opening = `${field.label}.${field.hint ? ` ${field.hint}` : ''}`;
  switch (field.type) {
    case 'quantity':
      return Typed(
        sentence(
          opening,
          `A number is in ${field.unit}; a text may name any unit of ${quantityOf(field.unit)}.`,
          bounds(field, field.unit),
          field.usual !== undefined && `Usually ${field.usual} ${field.unit} (common practice, a setting of the shop).`,
        ),
      );
    case 'number':
      return Typed(
        sentence(
          opening,
          bounds(field, field.after ?? 'numbers'),
          field.usual !== undefined && `Usually ${field.usual}.`,
        ),
      );
    case 'choice': {
      const values = field.options.map(({ value }) => value) as [string, ...string[]];
      const names = field.options.map(({ value, label }) => `${value}: ${label}`).join('; ');
      return z
        .enum(values)
        .nullish()
        .describe(sentence(opening, `${names}.`));
    }
    case 'text':
      return z.string().max(field.most).nullish().describe(opening);
  }
}

const isRequired = (field: Column): boolean =>
  !field.optional && field.type !== 'choice' && !('usual' in field && field.usual !== undefined);

function fieldSchema(field: Field): z.ZodTypeAny {
  if (field.type === 'band') {
    const end = (which: string) => Typed(`${which}, as a number in ${field.unit} or a text with its unit.`);
    const shape = z
      .object({ min: end('The least'), max: end('The most') })
      .strict()
      .describe(sentence(`${field.label}.`, field.hint));
    return field.optional ? shape.nullish() : shape;
  }
  if (field.type === 'rows') {
    const row = z.object(shapeOf(field.columns)).strict().describe(`${field.item}, in the order of their numbers`);
    return z
      .array(row)
      .max(field.most)
      .describe(sentence(`${field.label}.`, field.hint, field.least > 0 && `At least ${field.least}.`));
  }
  return columnSchema(field);
}

/** A required box may not be left out; one that is there but empty is for `readInputs` to name. */
function shapeOf(fields: Fields): Record<string, z.ZodTypeAny> {
  return Object.fromEntries(
    Object.entries(fields).map(([name, field]) => {
      const schema = fieldSchema(field);
      const required =
        field.type === 'rows' ? field.least > 0 : field.type === 'band' ? !field.optional : isRequired(field);
      if (!required) return [name, field.type === 'rows' ? schema.optional() : schema];
      return [name, schema instanceof z.ZodOptional ? requiredOf(schema) : schema];
    }),
  );
}

/** `nullish` is optional around nullable; a required box is the nullable alone, with the words kept. */
function requiredOf(schema: z.ZodOptional<z.ZodTypeAny>): z.ZodTypeAny {
  const inner = schema.unwrap();
  const bare = inner instanceof z.ZodNullable ? (inner as z.ZodNullable<z.ZodTypeAny>).unwrap() : inner;
  return schema.description ? bare.describe(schema.description) : bare;
}

/** Zod schema of a worksheet's inputs: strict, so that a misspelt name is told. */
export const inputSchema = (fields: Fields) => z.object(shapeOf(fields)).strict();
