import { z } from 'zod';
import { LONGEST_ALT, LONGEST_REASON, MOST_PHOTOS } from '../../photos/photos';
import { Id, PersonRef } from './common';

/** Photos as evidence. The OpenAPI document is made from these schemas. */

const Alt = z
  .string()
  .trim()
  .max(LONGEST_ALT, `must be ${LONGEST_ALT} characters or fewer`)
  .describe('What the photo shows, for whoever cannot see it');

/** What goes along with the file of an upload. */
export const UploadPhoto = z.object({
  alt: Alt.default('').describe('What it shows; may also be given when it is sent'),
});

export const UploadedPhoto = z.object({
  id: Id,
  width: z.number().int().describe('Pixels, upright'),
  height: z.number().int(),
  bytes: z.number().int().describe('Of the picture that is kept, not of the file that was sent'),
  url: z.string().describe('The picture, a JPEG'),
  small: z.string().describe('The same, at most 480 pixels long'),
  alt: z.string(),
});
export type UploadedPhoto = z.infer<typeof UploadedPhoto>;

export const PhotoChoice = z
  .union([Id, z.object({ id: Id, alt: Alt })])
  .describe('An uploaded photo, with what it shows unless that was said when it was uploaded');
export type PhotoChoice = z.output<typeof PhotoChoice>;

export const PhotoChoices = z
  .array(PhotoChoice)
  .max(MOST_PHOTOS, `must be ${MOST_PHOTOS} or fewer`)
  .default([])
  .describe('My own uploaded photos, in the order in which they are shown');

export const Photo = UploadedPhoto.extend({
  at: z.string(),
  removed: z
    .object({ person: PersonRef, at: z.string(), reason: z.string() })
    .nullable()
    .describe('Set once it was removed; the picture is then gone'),
  may: z.object({
    takeOff: z.boolean().describe('Nobody has seen it yet: it can be taken off without a word'),
    remove: z.boolean().describe('With a reason that stays'),
  }),
});
export type Photo = z.infer<typeof Photo>;

export const AddPhotos = z.object({ photos: PhotoChoices });
export const PhotoList = z.object({ items: z.array(Photo) });
export type PhotoList = z.infer<typeof PhotoList>;

export const RemovePhoto = z.object({
  reason: z
    .string()
    .trim()
    .min(1, 'Write why, for whoever saw it')
    .max(LONGEST_REASON, `must be ${LONGEST_REASON} characters or fewer`),
});
