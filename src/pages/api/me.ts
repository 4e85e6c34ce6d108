import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';

export const GET = endpoint(operations.me, ({ actor }) => ({
  id: actor.id,
  name: actor.name,
  email: actor.email,
  roles: [...actor.roles],
}));
