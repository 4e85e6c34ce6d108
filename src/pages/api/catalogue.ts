import { operations } from '@/lib/contracts';
import { catalogueList } from '@/lib/server/catalogue';
import { endpoint } from '@/lib/server/http';

export const GET = endpoint(operations.catalogue, ({ actor, query }) => catalogueList(actor, query));
