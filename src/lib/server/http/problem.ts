import { STATUS_CODES } from 'node:http';
import type { Refusal } from '../refusal';

/** A refusal as an RFC 9457 problem document. */
export function problemResponse(refusal: Refusal): Response {
  const { fields, current, headers } = refusal.extra;
  const problem = {
    type: `urn:couplet:problem:${refusal.kind}`,
    title: STATUS_CODES[refusal.status] ?? 'Problem',
    status: refusal.status,
    detail: refusal.message,
    ...(fields ? { fields } : {}),
    ...(current === undefined ? {} : { current }),
  };
  return new Response(JSON.stringify(problem), {
    status: refusal.status,
    headers: { 'Content-Type': 'application/problem+json; charset=utf-8', ...headers },
  });
}
