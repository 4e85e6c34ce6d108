import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { lucia, signIn, signOut } from '@/lib/server/people';

export const POST = endpoint(operations.signIn, async ({ body, context }) => {
  const { cookies, clientAddress, request } = context;
  const { cookie, person } = await signIn({
    ...body,
    address: clientAddress,
    agent: request.headers.get('user-agent') ?? '',
    previous: cookies.get(lucia().sessionCookieName)?.value ?? null,
  });
  cookies.set(cookie.name, cookie.value, cookie.attributes);
  return person;
});

export const DELETE = endpoint(operations.signOut, async ({ actor, context }) => {
  const cookie = await signOut(actor, context.locals.session?.id ?? '');
  context.cookies.set(cookie.name, cookie.value, cookie.attributes);
  return new Response(null, { status: 204, headers: { 'Clear-Site-Data': '"cache"' } });
});
