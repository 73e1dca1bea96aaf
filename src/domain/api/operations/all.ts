import * as book from './book';
import * as bulletins from './bulletins';
import * as flags from './flags';
import * as history from './history';
import * as imports from './imports';
import * as me from './me';
import * as photos from './photos';
import * as proposals from './proposals';
import * as search from './search';
import * as shop from './shop';
import * as threads from './threads';
import * as versions from './versions';
import * as worksheets from './worksheets';
import type { Operation } from '../operation';

/** Every call of the API, in the order the OpenAPI document lists them. An area adds its file here. */
export const OPERATIONS: readonly Operation[] = [
  me,
  book,
  bulletins,
  flags,
  history,
  imports,
  proposals,
  threads,
  versions,
  photos,
  search,
  worksheets,
  shop,
].flatMap((area) => Object.values(area));
