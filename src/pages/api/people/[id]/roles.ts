import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { changeRoles } from '@/lib/server/people';

export const PUT = endpoint(operations.changeRoles, ({ actor, params, body }) => changeRoles(actor, params.id, body.roles));
