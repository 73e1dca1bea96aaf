import { z } from 'zod';
import { operation } from '../operation';
import { Id } from '../schemas/common';
import { AddPhotos, Photo, PhotoList, RemovePhoto, UploadedPhoto, UploadPhoto } from '../schemas/photos';

const OfPhoto = z.object({ id: Id });

export const uploadPhoto = operation({
  id: 'uploadPhoto',
  method: 'post',
  path: '/photos',
  area: 'Review',
  summary: 'Upload a photo, to be sent with a message, a flag or the reason of a proposal',
  description:
    'A JPEG, PNG, WebP or AVIF picture of at most 15 MB and 64 megapixels. It is turned upright, scaled to 12 megapixels and written anew as JPEG without what the camera noted. Until it is sent nobody else sees it; after a day it is thrown away.',
  file: 'photo',
  body: UploadPhoto,
  status: 201,
  reply: UploadedPhoto,
  refuses: [409],
});

export const deletePhoto = operation({
  id: 'deletePhoto',
  method: 'delete',
  path: '/photos/{id}',
  area: 'Review',
  summary: 'Take a photo of mine off before anybody else saw it',
  description: '409 once it was sent; then it is removed with a reason.',
  params: OfPhoto,
  refuses: [409],
});

export const removePhoto = operation({
  id: 'removePhoto',
  method: 'post',
  path: '/photos/{id}/remove',
  area: 'Review',
  summary: 'Remove a photo that was sent, with a reason that stays',
  description: 'For an editor of the book, and for ten minutes for whoever sent it.',
  params: OfPhoto,
  body: RemovePhoto,
  reply: Photo,
  refuses: [409],
});

export const addEvidence = operation({
  id: 'addEvidence',
  method: 'post',
  path: '/proposals/{id}/photos',
  area: 'Proposals',
  summary: 'Add photos to the reason of my draft, as evidence',
  params: OfPhoto,
  body: AddPhotos,
  status: 201,
  reply: PhotoList,
  refuses: [409],
});
