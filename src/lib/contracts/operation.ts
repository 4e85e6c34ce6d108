import type { z } from 'zod';
import type { Action } from '@/lib/access';

/** One call of the API: what endpoints parse by, who may ask, and what the API's description is made from. */
export interface Operation {
  readonly method: 'GET' | 'POST' | 'PUT' | 'DELETE';
  /** Path with `{names}` as in OpenAPI. */
  readonly path: `/api/${string}`;
  readonly summary: string;
  readonly tag: string;
  /** What one must be allowed; `open` asks for no sign-in. Rules about one thing are asked again by the use case. */
  readonly may: Action | 'open';
  readonly params?: z.ZodType;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType;
  /** `file`: the body is multipart/form-data with one file. */
  readonly multipart?: true;
  /** Writes over a version: If-Match is required. */
  readonly ifMatch?: true;
  readonly status: 200 | 201 | 204;
  readonly answer?: z.ZodType;
  /** Media type of an answer that is not JSON. */
  readonly media?: string;
  /** Answers 304 where If-None-Match names what is there. */
  readonly revalidates?: true;
  /** Problem statuses beyond those that follow from the rest. */
  readonly problems?: readonly number[];
}

export const operation = <const O extends Operation>(it: O): O => it;
