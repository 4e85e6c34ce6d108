import { operations } from '@/lib/contracts';
import { endpoint } from '@/lib/server/http';
import { vendorList } from '@/lib/server/parts';

export const GET = endpoint(operations.vendors, () => vendorList());
