import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { outbox } from '@/lib/server/mail';

export const GET = endpoint(operations.mail, ({ actor }) => outbox(actor));
